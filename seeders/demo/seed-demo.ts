/** Lays out the demo laboratory, once. */
export async function seedDemo(): Promise<void> {}
