import { Skeleton } from '@/components/ui/skeleton';

export default function LogLoadingPage() {
  return <Skeleton lines={10} table />;
}
