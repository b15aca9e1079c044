// Added to a page that is measured: tells in its title when it showed its first usable screen.
{
  const root = document.documentElement;
  let usable;
  const tell = () => {
    const painted = performance.getEntriesByName("first-contentful-paint")[0]?.startTime ?? 0;
    document.title = `usable ${root.dataset.offline ?? "-"} ${usable} ${painted}`;
  };
  const note = () => {
    usable ??= performance.now();
    setInterval(tell, 200);
  };
  new MutationObserver((_, observer) => {
    if (root.dataset.app !== "usable") return;
    observer.disconnect();
    note();
  }).observe(root, { attributes: true });
  // The bare page doesn't wait for the frame; the same two frames are waited for here.
  new BroadcastChannel("bare").onmessage = () =>
    requestAnimationFrame(() => requestAnimationFrame(note));
}
