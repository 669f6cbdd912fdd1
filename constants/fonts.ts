import { AtkinsonHyperlegibleNext_400Regular } from '@expo-google-fonts/atkinson-hyperlegible-next/400Regular';
import { AtkinsonHyperlegibleNext_600SemiBold } from '@expo-google-fonts/atkinson-hyperlegible-next/600SemiBold';
import { AtkinsonHyperlegibleNext_700Bold } from '@expo-google-fonts/atkinson-hyperlegible-next/700Bold';
import { BarlowSemiCondensed_500Medium } from '@expo-google-fonts/barlow-semi-condensed/500Medium';
import { BarlowSemiCondensed_600SemiBold } from '@expo-google-fonts/barlow-semi-condensed/600SemiBold';
import { BarlowSemiCondensed_700Bold } from '@expo-google-fonts/barlow-semi-condensed/700Bold';
import { Platform } from 'react-native';

// Imported by weight: a package's index would ship every weight and italic to the phone.
/** What the root layout hands to `useFonts`. */
export const fontFiles = {
  AtkinsonHyperlegibleNext_400Regular,
  AtkinsonHyperlegibleNext_600SemiBold,
  AtkinsonHyperlegibleNext_700Bold,
  BarlowSemiCondensed_500Medium,
  BarlowSemiCondensed_600SemiBold,
  BarlowSemiCondensed_700Bold,
};

// A browser that could not fetch a font still gets something narrow and plain; a native platform takes one name only.
const figure = (name: keyof typeof fontFiles) =>
  Platform.select({ web: `${name}, "Arial Narrow", Arial, sans-serif`, default: name });
const text = (name: keyof typeof fontFiles) => Platform.select({ web: `${name}, Verdana, Arial, sans-serif`, default: name });

/** Families by job: figures, headings, buttons and labels are Barlow; running text is Atkinson. One family is one weight. */
export const fonts = {
  figure: figure('BarlowSemiCondensed_600SemiBold'),
  figureMedium: figure('BarlowSemiCondensed_500Medium'),
  figureBold: figure('BarlowSemiCondensed_700Bold'),
  text: text('AtkinsonHyperlegibleNext_400Regular'),
  textSemibold: text('AtkinsonHyperlegibleNext_600SemiBold'),
  textBold: text('AtkinsonHyperlegibleNext_700Bold'),
};
