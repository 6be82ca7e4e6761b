declare module "wawoff2" {
  /** Unpacks a WOFF2 font to TrueType. */
  export function decompress(packed: Uint8Array): Promise<Uint8Array>;
}
