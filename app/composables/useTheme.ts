const KEPT_AS = 'tallyrail.light';

/**
 * Day or night: what the system says until somebody turns the switch, and from then on what they chose.
 * The page's first script (app.vue) sets the same attribute before anything is drawn.
 */
export function useTheme() {
  const theme = useState<'day' | 'night'>('theme', () => 'day');
  onMounted(() => {
    theme.value = document.documentElement.dataset.theme === 'night' ? 'night' : 'day';
  });
  function turn(): void {
    theme.value = theme.value === 'night' ? 'day' : 'night';
    document.documentElement.dataset.theme = theme.value;
    try {
      localStorage.setItem(KEPT_AS, theme.value);
    } catch {
      // Storage may be shut: the choice then holds for this visit.
    }
  }
  return { theme, turn };
}

/** Runs before the first paint, so that a night shop never sees a white flash. */
export const THEME_SCRIPT = `(function(){var t;try{t=localStorage.getItem('${KEPT_AS}')}catch(e){}if(t!=='day'&&t!=='night')t=matchMedia('(prefers-color-scheme: dark)').matches?'night':'day';document.documentElement.dataset.theme=t})()`;
