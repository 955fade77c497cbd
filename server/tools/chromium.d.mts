export function findChromium(): string | undefined;
