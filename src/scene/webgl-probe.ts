/** How this browser can draw the room. */
export type Graphics = 'gpu' | 'software' | 'none';

const SOFTWARE = /swiftshader|llvmpipe|software|basic render/i;

let found: Graphics | null = null;

/**
 * Asks a throw-away canvas, once, before anything is mounted: a renderer that fails later takes the whole page with it.
 * Software WebGL is told by the name of its renderer; a performance caveat does not give it away.
 */
export function probeGraphics(): Graphics {
  found ??= probe();
  return found;
}

function probe(): Graphics {
  try {
    const context = document.createElement('canvas').getContext('webgl2');
    if (context === null) return 'none';
    const named = context.getExtension('WEBGL_debug_renderer_info');
    const renderer = String(context.getParameter(named === null ? context.RENDERER : named.UNMASKED_RENDERER_WEBGL));
    context.getExtension('WEBGL_lose_context')?.loseContext();
    return SOFTWARE.test(renderer) ? 'software' : 'gpu';
  } catch {
    return 'none';
  }
}
