/** Whether this browser can draw in 3D: WebGL 2, which the depth textures need. Asked once, on the page. */
export function hasWebgl(): boolean {
  try {
    const context = document.createElement('canvas').getContext('webgl2');
    // Browsers keep few contexts alive: this one goes back at once.
    context?.getExtension('WEBGL_lose_context')?.loseContext();
    return context !== null;
  } catch {
    return false;
  }
}
