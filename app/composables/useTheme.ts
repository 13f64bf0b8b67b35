/**
 * Day or night: what the system says until somebody turns the switch, and from then on what they chose.
 * The page's first script (app/utils/themeScript) sets the same attribute before anything is drawn.
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
      localStorage.setItem(THEME_KEPT_AS, theme.value);
    } catch {
      // Storage may be shut: the choice then holds for this visit.
    }
  }
  return { theme, turn };
}
