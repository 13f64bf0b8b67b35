/** Where the choice of day or night is kept. */
export const THEME_KEPT_AS = 'tallyrail.light';

/** Runs before the first paint, so that a night shop never sees a white flash. */
export const THEME_SCRIPT = `(function(){var t;try{t=localStorage.getItem('${THEME_KEPT_AS}')}catch(e){}if(t!=='day'&&t!=='night')t=matchMedia('(prefers-color-scheme: dark)').matches?'night':'day';document.documentElement.dataset.theme=t})()`;
