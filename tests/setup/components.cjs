// What react-native-web and the components expect of a browser and jsdom does not have.
globalThis.__DEV__ = false;
globalThis.IS_REACT_ACT_ENVIRONMENT = true;

globalThis.ResizeObserver ??= class ResizeObserver {
  observe() {}
  unobserve() {}
  disconnect() {}
};

// jsdom has no media queries: nothing matches, so the light theme and full motion apply
globalThis.matchMedia ??= (query) => ({
  matches: false,
  media: query,
  onchange: null,
  addEventListener() {},
  removeEventListener() {},
  addListener() {},
  removeListener() {},
  dispatchEvent: () => false,
});

// from Node, where jsdom leaves them out
const { TextDecoder, TextEncoder } = require('node:util');
globalThis.TextEncoder ??= TextEncoder;
globalThis.TextDecoder ??= TextDecoder;
globalThis.structuredClone ??= (value) => require('node:v8').deserialize(require('node:v8').serialize(value));
