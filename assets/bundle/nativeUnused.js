// Stands in for parts of react-native-web that this product does not use (metro.config.js), a twentieth of what loads
// first. They would come along whole, since libraries import from the package's one index. Lint refuses to import one.
export default function Absent() {
  throw new Error('This part of react-native-web is left out of the web bundle, see assets/bundle/nativeUnused.js.');
}
