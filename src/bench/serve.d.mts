export const CONTENT_POLICY: string;
export function serve(folder: string, port?: number, tries?: number): Promise<{ readonly url: string; close(): Promise<void> }>;
