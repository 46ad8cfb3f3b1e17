/** Stored with every evaluation, so that a reader knows which computation made a figure. */
export const LIBRARY_VERSION = '1.0.0';
