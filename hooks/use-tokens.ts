import { useColorScheme } from 'react-native';
import { themes, type Tokens } from '@/constants/theme';

/** The tokens of the theme that the device asks for; light where it does not say. */
export function useTokens(): Tokens {
  return useColorScheme() === 'dark' ? themes.dark : themes.light;
}
