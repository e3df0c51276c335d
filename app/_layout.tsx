import { Slot } from 'expo-router';

import { AppFrame } from '@/components/shell/AppFrame';
import { applyTheme } from '@/components/theme/theme';

export { LastBoundary as ErrorBoundary } from '@/components/shell/LastBoundary';

applyTheme();

export default function Layout() {
  return <AppFrame><Slot /></AppFrame>;
}
