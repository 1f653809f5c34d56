import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { create, type Font } from 'fontkit';

/** The faces of the product on paper; `signs` steps in where one of the others lacks a sign. */
export const faces = ['text', 'strong', 'figures', 'signs'] as const;
export type Face = (typeof faces)[number];

const places: Readonly<Record<Face, string>> = {
  // The whole fonts: the parts that browsers load have no file for a name such as Łukasiewicz.
  text: '@expo-google-fonts/archivo/400Regular/Archivo_400Regular.ttf',
  strong: '@expo-google-fonts/archivo/600SemiBold/Archivo_600SemiBold.ttf',
  figures: '@expo-google-fonts/sometype-mono/400Regular/SometypeMono_400Regular.ttf',
  signs: '@fontsource/noto-sans-math/files/noto-sans-math-latin-400-normal.woff',
};

const { resolve } = createRequire(import.meta.url);
export const fontPath = (face: Face): string => resolve(places[face]);

const read = new Map<Face, Font>();

function fontOf(face: Face): Font {
  const known = read.get(face);
  if (known !== undefined) return known;
  const font = create(readFileSync(fontPath(face)));
  if (!('hasGlyphForCodePoint' in font)) throw new Error(`${places[face]} holds several fonts.`);
  read.set(face, font);
  return font;
}

/** Whether a face can show a sign. */
export const canShow = (face: Face, sign: string): boolean =>
  fontOf(face).hasGlyphForCodePoint(sign.codePointAt(0) ?? 0);
