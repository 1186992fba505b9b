// Sets the chosen light before the first paint. A file, not inline: the content-security policy allows no inline script.
try {
  var chosen = localStorage.getItem("tenuity.theme");
  if (chosen === "light" || chosen === "dark") document.documentElement.dataset.theme = chosen;
} catch {
  // Storage is closed to this page: the device's light stands.
}
