export function migrate(url: string): Promise<string[]>;
export function rollBack(url: string): Promise<string[]>;
export function seed(url: string): Promise<string[]>;
