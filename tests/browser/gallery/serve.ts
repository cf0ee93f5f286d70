import tailwindcss from '@tailwindcss/postcss';
import type { Server } from 'node:http';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build, preview, type Plugin } from 'vite';

const root = fileURLToPath(new URL('../../../', import.meta.url)).replace(/\/$/, '');

/** A board with its jumper, for whatever stored picture a view asks for. */
const pictures: Plugin = {
  name: 'pictures',
  configurePreviewServer({ middlewares }) {
    middlewares.use('/api/files', (_request, response) => {
      response.setHeader('content-type', 'image/svg+xml');
      response.end(
        `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 400 300"><path fill="#e8e4d8" stroke="#222" stroke-width="4" d="M20 20h360v260H20z"/><path fill="none" stroke="#222" stroke-width="4" d="M60 70h90v60H60zM230 180h90v60h-90z"/><path fill="#22b" d="M200 70h50v24h-50z"/></svg>`,
      );
    });
  },
};

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
  const server = await preview({ ...shared, plugins: [pictures], preview: { host: '127.0.0.1', port: 0 } });
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
