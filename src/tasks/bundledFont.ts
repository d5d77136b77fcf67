import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';

/** The bundled family, as files. The page, the picture writer and the tables all take these two. */
const require = createRequire(import.meta.url);
const family = '@expo-google-fonts/source-sans-3';

export const fontFiles = {
  400: require.resolve(`${family}/400Regular/SourceSans3_400Regular.ttf`),
  600: require.resolve(`${family}/600SemiBold/SourceSans3_600SemiBold.ttf`),
} as const;

export const readFont = (weight: 400 | 600): Uint8Array => new Uint8Array(readFileSync(fontFiles[weight]));
