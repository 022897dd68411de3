export type RendererKind = 'cpu' | 'webgl';

/** Renderers that only imitate a graphics processor: ours is faster than those. */
const imitation = /swiftshader|llvmpipe|softpipe|software|basic render|lavapipe/i;

function probe(): RendererKind {
  const canvas = document.createElement('canvas');
  const context = canvas.getContext('webgl2', { failIfMajorPerformanceCaveat: true });
  if (context === null) {
    return 'cpu';
  }
  const info = context.getExtension('WEBGL_debug_renderer_info');
  const name = String(context.getParameter(info?.UNMASKED_RENDERER_WEBGL ?? context.RENDERER));
  context.getExtension('WEBGL_lose_context')?.loseContext();
  return imitation.test(name) ? 'cpu' : 'webgl';
}

let detected: RendererKind | null = null;

/** Which renderer suits this machine; `?renderer=cpu|webgl` in the address overrides it. */
export function detectRenderer(): RendererKind {
  const wanted = new URLSearchParams(window.location.search).get('renderer');
  if (wanted === 'cpu' || wanted === 'webgl') {
    return wanted;
  }
  detected ??= typeof WebGL2RenderingContext === 'undefined' ? 'cpu' : probe();
  return detected;
}
