import { notFound } from 'next/navigation';
import { isAppError } from '@/lib/errors';

/** For pages: what a service does not find becomes the page for missing things. */
export async function findOr404<T>(found: Promise<T>): Promise<T> {
  try {
    return await found;
  } catch (error) {
    if (isAppError(error) && error.code === 'not-found') notFound();
    throw error;
  }
}
