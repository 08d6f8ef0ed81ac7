/**
 * Tells assistive technology which of the grid's cells belong to the block: those that carry the block's class, also
 * where the grid draws them only later, in scrolling.
 *
 * @returns ends it.
 */
export function tellSelection(host: HTMLElement): () => void {
  const tell = (node: Node): void => {
    if (!(node instanceof HTMLElement) || !node.classList.contains('ag-cell')) return;
    if (node.classList.contains('kv-block-cell')) node.setAttribute('aria-selected', 'true');
    else node.removeAttribute('aria-selected');
  };
  const observer = new MutationObserver((changes) => {
    for (const { type, target, addedNodes } of changes)
      if (type === 'attributes') tell(target);
      else
        for (const added of addedNodes) {
          tell(added);
          if (added instanceof HTMLElement) added.querySelectorAll('.kv-block-cell').forEach(tell);
        }
    host.querySelector('[role=grid]')?.setAttribute('aria-multiselectable', 'true');
  });
  observer.observe(host, {
    ...{ subtree: true, childList: true },
    ...{ attributes: true, attributeFilter: ['class'] },
  });
  return () => {
    observer.disconnect();
  };
}
