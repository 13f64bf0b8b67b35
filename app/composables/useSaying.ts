/** What a screen reader is told when something settles on its own: one polite sentence at a time. */
export function useSaying() {
  const said = useState('announced', () => '');
  function announce(sentence: string): void {
    // The same words twice are said twice only if the text changes in between.
    said.value = said.value === sentence ? `${sentence}\u00a0` : sentence;
  }
  return { said, announce };
}
