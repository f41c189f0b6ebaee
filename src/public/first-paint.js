// Before anything is painted: the appearance that was chosen last, so that no bright page flashes up at night.
try {
  const chosen = localStorage.getItem('evenfall.appearance');
  if (chosen) document.documentElement.dataset.appearance = chosen;
} catch {
  // Storage may be closed to this page; the system's preference then holds.
}
