import { createRequire } from 'node:module'
import { openSync, type Font } from 'fontkit'
import type PDFDocument from 'pdfkit'
import type { Cut } from '@shared/court/scene'

/** The static cuts that a page embeds: whole TrueType files, because subsets drop letters in pdfkit. */
const FILES = {
  'archivo-400': '@expo-google-fonts/archivo/400Regular/Archivo_400Regular.ttf',
  'archivo-500': '@expo-google-fonts/archivo/500Medium/Archivo_500Medium.ttf',
  'archivo-600': '@expo-google-fonts/archivo/600SemiBold/Archivo_600SemiBold.ttf',
  'archivo-700': '@expo-google-fonts/archivo/700Bold/Archivo_700Bold.ttf',
  'archivo-800': '@expo-google-fonts/archivo/800ExtraBold/Archivo_800ExtraBold.ttf',
  'narrow-500': '@expo-google-fonts/archivo-narrow/500Medium/ArchivoNarrow_500Medium.ttf',
  'narrow-600': '@expo-google-fonts/archivo-narrow/600SemiBold/ArchivoNarrow_600SemiBold.ttf',
  'narrow-700': '@expo-google-fonts/archivo-narrow/700Bold/ArchivoNarrow_700Bold.ttf',
} as const
export type FontName = keyof typeof FILES

export type FontWeight = 400 | 500 | 600 | 700 | 800

const WIDE: Record<FontWeight, FontName> = {
  400: 'archivo-400',
  500: 'archivo-500',
  600: 'archivo-600',
  700: 'archivo-700',
  800: 'archivo-800',
}
/** The narrow face stops at 700. */
const NARROW: Record<FontWeight, FontName> = {
  400: 'narrow-500',
  500: 'narrow-500',
  600: 'narrow-600',
  700: 'narrow-700',
  800: 'narrow-700',
}

/** The embedded font of a cut and weight: labels and counts are narrow, sentences and names are not. */
export function fontFor(cut: Cut, weight: FontWeight): FontName {
  return cut === 'label' || cut === 'count' ? NARROW[weight] : WIDE[weight]
}

let faces: [FontName, Font][] | null = null

/** The faces, opened once a process: what the library works out of a font's tables then serves every page. */
function facesOnce(): [FontName, Font][] {
  // Resolved from this module, so that the built server and the tests find the packages alike.
  const require = createRequire(import.meta.url)
  faces ??= Object.entries(FILES).map(([name, file]) => [
    name as FontName,
    openSync(require.resolve(file)) as Font,
  ])
  return faces
}

/** Makes every cut known to a document by its FontName; only those used are embedded. */
export function registerFonts(doc: InstanceType<typeof PDFDocument>): void {
  // pdfkit takes an opened font as well; its types name only files and bytes.
  for (const [name, face] of facesOnce())
    doc.registerFont(name, face as unknown as PDFKit.Mixins.PDFFontSource)
}
