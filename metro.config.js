// Metro bundles the web client. Three things differ from Expo's defaults: folders that never belong to the
// client are out of its sight, parts of zod, react-native-web and expo-router that it never needs are
// replaced by small stand-ins, and in development /api goes to the server, so that cookies stay same-origin.
const { createHash } = require('node:crypto');
const { readFileSync } = require('node:fs');
const http = require('node:http');
const path = require('node:path');
const { getDefaultConfig } = require('expo/metro-config');

const root = __dirname;
const config = getDefaultConfig(root);

// Babel writes app.json into the bundle, yet Metro's cache does not look at it: an old one would go on.
config.cacheVersion = createHash('sha256').update(readFileSync(path.join(root, 'app.json'))).digest('hex').slice(0, 16);

const escaped = (text) => text.replace(/[.*+?^${}()|[\]\\/]/g, '\\$&');
const outside = ['server', 'tests', 'scripts', 'build', 'dist', '.data', 'docs', 'coverage']
  .map((folder) => new RegExp(`^${escaped(path.join(root, folder) + path.sep)}`));
config.resolver.blockList = [].concat(config.resolver.blockList ?? [], outside);

/** Files of packages, each with what stands in for it in the bundle. */
const inPackage = (folder, files, by) => files.map((file) => [path.join(root, 'node_modules', folder, file), path.join(root, 'assets', 'bundle', by)]);
const replaced = new Map([
  ...inPackage('zod/v4', ['locales/index.js'], 'zodLocales.js'),
  ...inPackage('zod/v4', ['core/compile.js', 'core/to-json-schema.js', 'core/json-schema-processors.js', 'core/json-schema-generator.js', 'classic/from-json-schema.js'], 'zodUnused.js'),
  ...inPackage('expo-router/build', [
    'stack/index.js', 'layouts/Tabs.js', 'layouts/experimental-stack/index.js', 'fork/native-stack/createNativeStackNavigator.js',
    'react-navigation/bottom-tabs/index.js',
  ], 'routerUnused.js'),
  ...inPackage('react-native-web/dist/exports', [
    'FlatList', 'SectionList', 'VirtualizedList', 'Button', 'CheckBox', 'Picker', 'ProgressBar', 'ImageBackground', 'YellowBox',
    'TouchableHighlight', 'TouchableNativeFeedback', 'TouchableOpacity', 'TouchableWithoutFeedback',
  ].map((name) => `${name}/index.js`), 'nativeUnused.js'),
]);
const resolveBefore = config.resolver.resolveRequest;
config.resolver.resolveRequest = (context, name, platform) => {
  const found = (resolveBefore ?? context.resolveRequest)(context, name, platform);
  const by = found.type === 'sourceFile' && replaced.get(found.filePath);
  return by ? { type: 'sourceFile', filePath: by } : found;
};

/** Forwards /api to the server of `npm run dev`. */
function forwardApi(request, response) {
  const upstream = http.request(
    { host: '127.0.0.1', port: Number(process.env.API_PORT ?? 4300), path: request.url, method: request.method, headers: request.headers },
    (answer) => {
      response.writeHead(answer.statusCode ?? 502, answer.headers);
      answer.pipe(response);
    },
  );
  upstream.on('error', () => {
    if (response.headersSent) return response.destroy();
    response.writeHead(503, { 'content-type': 'application/problem+json' });
    response.end(JSON.stringify({ type: 'about:blank', title: 'The server is not up yet.', status: 503 }));
  });
  request.pipe(upstream);
}

config.server.enhanceMiddleware = (metro) => (request, response, next) =>
  /^\/api(\/|\?|$)/.test(request.url ?? '') ? forwardApi(request, response) : metro(request, response, next);

module.exports = config;
