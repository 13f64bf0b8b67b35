/** Whether a request's path (query and all) is the API's and not a page's. */
export function isApi(path: string): boolean {
  return /^\/api(?=[/?]|$)/.test(path);
}
