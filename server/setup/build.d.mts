export function buildIsCurrent(): boolean;
export function build(): Promise<void>;
