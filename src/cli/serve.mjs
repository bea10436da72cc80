/**
 * Serves dist to this machine only.
 * @param {string} root folder of package.json
 * @param {number} port the port to try first; the next free one is taken when it is in use
 * @returns {Promise<{ url: string, close: () => Promise<void> }>}
 */
export async function servePage(root, port) {
  const { preview } = await import('vite');
  const server = await preview({
    root,
    configFile: false,
    // An address that is not there is an error, not the page once more.
    appType: 'mpa',
    logLevel: 'error',
    preview: { host: '127.0.0.1', port, strictPort: false, open: false },
  });
  const url = server.resolvedUrls?.local[0];
  if (!url) throw new Error('the page server has no local address');
  return { url, close: () => server.close() };
}
