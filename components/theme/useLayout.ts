import { useWindowDimensions } from 'react-native';

import { breakpoints } from './tokens';

/** What the frame and the columns need to know of the window. */
export function useLayout() {
  const { width, height } = useWindowDimensions();
  return {
    width,
    height,
    /** rail at the left, two columns, dense controls inside cards */
    isWide: width >= breakpoints.rail,
    hasThreeColumns: width >= breakpoints.threeColumns,
    /** a landscape phone or a strongly zoomed page: bars scroll away with the page */
    isShort: height < breakpoints.short,
  };
}
