import { Lora_400Regular } from '@expo-google-fonts/lora/400Regular';
import { Lora_400Regular_Italic } from '@expo-google-fonts/lora/400Regular_Italic';
import { Lora_500Medium } from '@expo-google-fonts/lora/500Medium';
import { Lora_500Medium_Italic } from '@expo-google-fonts/lora/500Medium_Italic';
import { SourceSans3_300Light } from '@expo-google-fonts/source-sans-3/300Light';
import { SourceSans3_400Regular } from '@expo-google-fonts/source-sans-3/400Regular';
import { SourceSans3_600SemiBold } from '@expo-google-fonts/source-sans-3/600SemiBold';
import { FontDisplay, type FontSource } from 'expo-font';
import { registeredFamily, type FontName } from './fontNames';

/** The bundled files by our names; saved figures embed them too. */
export const fontFiles: Record<FontName, number> = {
  lora: Lora_400Regular,
  loraItalic: Lora_400Regular_Italic,
  loraMedium: Lora_500Medium,
  loraMediumItalic: Lora_500Medium_Italic,
  sansLight: SourceSans3_300Light,
  sans: SourceSans3_400Regular,
  sansSemibold: SourceSans3_600SemiBold,
};

/** What the font loader wants: family name to file, shown in a fall-back face until it has come. */
export function fontSources(): Record<string, FontSource> {
  const sources: Record<string, FontSource> = {};
  for (const name of Object.keys(fontFiles) as FontName[]) {
    sources[registeredFamily[name]] = { uri: fontFiles[name], display: FontDisplay.SWAP };
  }
  return sources;
}
