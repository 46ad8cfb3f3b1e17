export function buildWhenStale(): Promise<void>;
export function isBuildStale(): boolean;
