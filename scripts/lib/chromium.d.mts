export function chromiumPath(): string;
export function requireChromium(): Promise<void>;
