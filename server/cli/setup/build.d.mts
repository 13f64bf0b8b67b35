export function sourcesHash(): string;
export function isBuilt(): boolean;
export function buildIfChanged(): Promise<void>;
