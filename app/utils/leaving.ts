/** Somebody signed out here without a network: their session ends as soon as there is one. */
export const LEAVING = 'tallyrail.leaving';

export function isLeaving(): boolean {
  try {
    return localStorage.getItem(LEAVING) !== null;
  } catch {
    return false; // storage is shut: nothing is kept either
  }
}
