// Stands in for the ready-made navigators of expo-router (metro.config.js): the product draws its own frame around one
// Slot, and stack and tab bars with their headers would be a tenth of what loads first. Lint refuses to import one.
function Absent() {
  throw new Error('This navigator is left out of the web bundle, see assets/bundle/routerUnused.js.');
}

// called when the router loads, long before anything is drawn
export const createNativeStackNavigator = () => ({ Navigator: Absent, Screen: Absent, Group: Absent });
export { Absent as ExperimentalStack, Absent as Stack, Absent as Tabs };
// the router's own error page asks whether it stands in a tab bar
export { BottomTabBarHeightContext } from 'expo-router/build/react-navigation/bottom-tabs/utils/BottomTabBarHeightContext';
