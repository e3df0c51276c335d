import { Slot } from 'expo-router';

import { AppFrame } from '@/components/shell/AppFrame';
import { followTheme } from '@/components/theme/theme';

export { LastBoundary as ErrorBoundary } from '@/components/shell/LastBoundary';

followTheme();

export default function Layout() {
  return <AppFrame><Slot /></AppFrame>;
}
