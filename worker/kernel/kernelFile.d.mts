export function projectFolder(from?: string): string;
export function kernelFile(root?: string): string;
