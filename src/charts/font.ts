/** Font files as bytes: only src/cli touches the disk. */
export interface FontFiles {
  readonly regular: Uint8Array;
  readonly bold: Uint8Array;
}

/** Measures a line of text in pixels. */
export interface FontMetrics {
  width(text: string, fontSizePx: number, bold: boolean): number;
}

/** A letter that the font lacks is drawn by some other font: as wide as the size, which errs on the wide side. */
const MISSING_EMS = 1;

/**
 * Reads the advance widths of a font in two weights (TrueType or OpenType). Kerning is left out: it is under one
 * per cent of a line. Throws where the bytes are not a font.
 */
export const prepareFont = async (files: FontFiles): Promise<FontMetrics> => {
  const { create } = await import('fontkitten');
  const weight = (bytes: Uint8Array): ((codePoint: number) => number) => {
    // The reader's types ask for a Buffer, but it reads any bytes.
    const font = create(bytes as Parameters<typeof create>[0]);
    if (font.isCollection) throw new Error('a single font was expected, found a collection');
    const known = new Map<number, number>();
    return (codePoint) => {
      let ems = known.get(codePoint);
      if (ems === undefined) {
        ems = font.hasGlyphForCodePoint(codePoint)
          ? font.glyphForCodePoint(codePoint).advanceWidth / font.unitsPerEm
          : MISSING_EMS;
        known.set(codePoint, ems);
      }
      return ems;
    };
  };
  const [regular, bold] = [weight(files.regular), weight(files.bold)];
  return {
    width(text, fontSizePx, isBold) {
      const advance = isBold ? bold : regular;
      let ems = 0;
      for (const letter of text) ems += advance(letter.codePointAt(0)!);
      return ems * fontSizePx;
    },
  };
};
