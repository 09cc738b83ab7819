/** A sheet of paper in points (1/72 inch), upright. */
export interface PaperSize {
  width: number;
  height: number;
}

export const paperNames = ['A4', 'Letter'] as const;
export type PaperName = (typeof paperNames)[number];

/** ISO 216 A4 is 210 mm x 297 mm; US Letter is 8.5 in x 11 in. */
export const paperSizes: Record<PaperName, PaperSize> = {
  A4: { width: (210 / 25.4) * 72, height: (297 / 25.4) * 72 },
  Letter: { width: 612, height: 792 },
};

/** The paper that printers of a country hold: Letter in the United States and Canada, A4 elsewhere. */
export function choosePaper(country: string): PaperName {
  return country === 'US' || country === 'CA' ? 'Letter' : 'A4';
}
