import { execFile } from 'node:child_process';
import { mkdir, readFile, symlink, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { promisify } from 'node:util';

import { projectRoot } from '../lib/productServer';

const run = promisify(execFile);

/**
 * An empty Expo Router page of the same SDK, built from the same node_modules: what any page on this framework loads at
 * the least. Its layout and route hold one text each; the settings are those of the product's app.json.
 * @returns the folder of the export
 */
export async function buildEmptyPage(folder: string): Promise<string> {
  const root = projectRoot();
  const product = JSON.parse(await readFile(path.join(root, 'package.json'), 'utf8')) as { dependencies: Record<string, string> };
  await mkdir(path.join(folder, 'app'), { recursive: true });
  const appJson = JSON.parse(await readFile(path.join(root, 'app.json'), 'utf8')) as { expo: Record<string, unknown> };
  await Promise.all([
    writeFile(path.join(folder, 'package.json'), JSON.stringify({ name: 'empty-page', version: '1.0.0', main: 'expo-router/entry', private: true, dependencies: product.dependencies })),
    writeFile(path.join(folder, 'app.json'), JSON.stringify({ expo: { ...appJson.expo, name: 'Empty', slug: 'empty' } })),
    writeFile(path.join(folder, 'babel.config.js'), await readFile(path.join(root, 'babel.config.js'), 'utf8')),
    writeFile(path.join(folder, 'tsconfig.json'), JSON.stringify({ extends: 'expo/tsconfig.base' })),
    writeFile(path.join(folder, 'app', '_layout.tsx'), "import { Slot } from 'expo-router';\nexport default function Layout() {\n  return <Slot />;\n}\n"),
    writeFile(path.join(folder, 'app', 'index.tsx'), "import { Text } from 'react-native';\nexport default function Page() {\n  return <Text>Empty</Text>;\n}\n"),
    symlink(path.join(root, 'node_modules'), path.join(folder, 'node_modules'), 'dir'),
  ]);
  const output = path.join(folder, 'dist');
  // a cache of its own: with node_modules shared, Metro would take parts of one project for those of the other
  const cache = path.join(folder, 'cache');
  await mkdir(cache);
  await run(process.execPath, [path.join(root, 'node_modules', 'expo', 'bin', 'cli'), 'export', '--platform', 'web', '--output-dir', output], {
    cwd: folder, maxBuffer: 16 * 1024 * 1024,
    env: { ...process.env, TMPDIR: cache, NODE_ENV: 'production', CI: '1', EXPO_OFFLINE: '1', EXPO_NO_TELEMETRY: '1', EXPO_NO_DOTENV: '1' },
  });
  return output;
}
