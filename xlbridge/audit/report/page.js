"use strict";
(() => {
  const all = (selector, within = document) => [...within.querySelectorAll(selector)];
  const one = (selector) => document.querySelector(selector);

  // filters: what does not match is hidden, and the count is said
  function filter(list, said, matches) {
    const items = all(list);
    const left = items.filter((item) => { item.hidden = !matches(item); return !item.hidden; });
    one(said).textContent = `${left.length} of ${items.length} shown`;
  }
  const holds = (item, text) => item.textContent.toLowerCase().includes(text.trim().toLowerCase());

  const answerOf = (item) => {
    const said = (part) => item.querySelector(`[data-part="${part}"]`).value.trim();
    return said("closed") ? "closed" : said("words") ? "answered" : "open";
  };
  function filterFindings() {
    const [text, severity, kind, sheet, answer] = ["text", "severity", "kind", "sheet", "answer"].map((id) => one(`#find-${id}`).value);
    filter(".finding", "#findings-said", (item) =>
      (!severity || item.dataset.severity === severity) && (!kind || item.dataset.kind === kind) &&
      (!sheet || item.dataset.sheets.split("|").includes(sheet)) && (!answer || answerOf(item) === answer) && holds(item, text));
  }
  function filterCells() {
    const [text, sheet, state] = ["cell-text", "cell-sheet", "cell-state"].map((id) => one(`#${id}`).value);
    filter(".cell", "#cells-said", (item) =>
      (!sheet || item.dataset.sheet === sheet) && (!state || item.dataset.state === state) && holds(item, text));
  }
  for (const [form, run] of [["#finding-filters", filterFindings], ["#cell-filters", filterCells]]) {
    const element = one(form);
    if (!element) continue;
    element.addEventListener("input", run);
    element.addEventListener("submit", (event) => event.preventDefault());
    run();
  }

  // the check record: fields carry the place of their text in it
  const record = JSON.parse(one("#record-data").textContent);
  const fields = all("[data-table]");
  const put = (found) => fields.forEach((field) => {
    const { table, key, part } = field.dataset;
    field.value = ((found[table] || {})[key] || {})[part] || "";
  });
  function taken() {
    const found = { people: {}, inputs: {}, findings: {} };
    for (const field of fields) {
      const { table, key, part } = field.dataset;
      if (field.value) (found[table][key] = found[table][key] || {})[part] = field.value;
    }
    return found;
  }
  const plain = (name) => (name || "").trim().toLowerCase().split(/\s+/).join(" ");
  function onePerson(found) {
    const name = (role) => plain((found.people[role] || {}).name);
    return name("originator") !== "" && name("originator") === name("checker");
  }
  const say = (text) => { one("#record-said").textContent = text; };
  function warnOfOnePerson() {
    const same = onePerson(taken());
    say(same ? "✗ Originator and checker are one person: name another." : "");
    return same;
  }
  put(record);
  fields.filter((field) => field.dataset.table === "people").forEach((field) => field.addEventListener("change", warnOfOnePerson));
  one("#record-save").addEventListener("click", () => {
    if (warnOfOnePerson()) return;
    const link = document.createElement("a");
    link.href = URL.createObjectURL(new Blob([JSON.stringify(taken(), null, 1)], { type: "application/json" }));
    link.download = one("#record-save").dataset.file;
    link.click();
    URL.revokeObjectURL(link.href);
    say("✓ Saved. Give the file to the next audit with --record.");
  });
  one("#record-load").addEventListener("change", async (event) => {
    try {
      const found = JSON.parse(await event.target.files[0].text());
      put(found);
      if (!warnOfOnePerson()) say("✓ Loaded.");
    } catch (error) {
      say(`✗ Not a check record: ${error.message}`);
    }
  });
  window.addEventListener("beforeprint", () => all("details").forEach((d) => { d.dataset.was = d.open; d.open = true; }));
  window.addEventListener("afterprint", () => all("details").forEach((d) => { d.open = d.dataset.was === "true"; }));
})();
