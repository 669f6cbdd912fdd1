import { useWindowDimensions } from 'react-native';
import { wideFrom } from '@/constants/theme';

/** Whether the window has room for the rail and columns (900 px and up). */
export function useWide(): boolean {
  return useWindowDimensions().width >= wideFrom;
}
