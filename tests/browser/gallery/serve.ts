import { fileURLToPath } from 'node:url';
import { createServer, type ViteDevServer } from 'vite';

const root = fileURLToPath(new URL('../../../', import.meta.url));

/** Serves the gallery on a free port of loopback. Close the server when done. */
export async function serveGallery(): Promise<{ server: ViteDevServer; address: string }> {
  const server = await createServer({
    configFile: false,
    root,
    logLevel: 'warn',
    resolve: { alias: { '@': root.replace(/\/$/, '') } },
    define: { 'process.env': {} },
    server: { host: '127.0.0.1', port: 0, hmr: false, watch: null },
    optimizeDeps: { entries: ['tests/browser/gallery/main.tsx'] },
    cacheDir: 'node_modules/.vite-gallery',
  });
  await server.listen();
  const { port } = server.httpServer!.address() as { port: number };
  return { server, address: `http://127.0.0.1:${port}/tests/browser/gallery/index.html` };
}
