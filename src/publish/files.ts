/** Path, with forward slashes → content. */
export type Files = ReadonlyMap<string, Uint8Array | string>;
