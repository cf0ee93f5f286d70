import tailwindcss from '@tailwindcss/postcss';
import type { Server } from 'node:http';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build, preview } from 'vite';

const root = fileURLToPath(new URL('../../../', import.meta.url)).replace(/\/$/, '');

/** Builds the gallery once and serves it on a free port of loopback. */
export async function serveGallery(): Promise<{ address: string; httpServer: Server; close: () => Promise<void> }> {
  const folder = mkdtempSync(join(tmpdir(), 'sillwright-gallery-'));
  const shared = {
    configFile: false as const,
    root: join(root, 'tests/browser/gallery'),
    logLevel: 'error' as const,
    build: { outDir: folder, emptyOutDir: true, minify: false, reportCompressedSize: false },
  };
  await build({
    ...shared,
    // The test runner's environment is not production, and would ask for the development form of JSX.
    oxc: { jsx: { runtime: 'automatic', development: false } },
    resolve: { alias: { '@': root } },
    define: { 'process.env': {}, 'process.env.NODE_ENV': '"production"' },
    css: { postcss: { plugins: [tailwindcss()] } },
  });
  const server = await preview({ ...shared, preview: { host: '127.0.0.1', port: 0 } });
  const { port } = server.httpServer.address() as { port: number };
  return {
    address: `http://127.0.0.1:${port}/`,
    httpServer: server.httpServer as Server,
    close: async () => {
      await server.close();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
