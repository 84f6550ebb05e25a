/**
 * Lora speaks for the science, Source Sans 3 for the interface and every measured number.
 * Each weight is its own family: native text and exported SVG know no other way to one file.
 */
export type FontName = 'lora' | 'loraItalic' | 'loraMedium' | 'loraMediumItalic' | 'sansLight' | 'sans' | 'sansSemibold';

/** Family names as registered with the loader and embedded in saved figures. */
export const registeredFamily: Record<FontName, string> = {
  lora: 'Lora_400Regular',
  loraItalic: 'Lora_400Regular_Italic',
  loraMedium: 'Lora_500Medium',
  loraMediumItalic: 'Lora_500Medium_Italic',
  sansLight: 'SourceSans3_300Light',
  sans: 'SourceSans3_400Regular',
  sansSemibold: 'SourceSans3_600SemiBold',
};
