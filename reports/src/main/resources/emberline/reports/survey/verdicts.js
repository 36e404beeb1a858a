  // The observer's verdicts: what the run was given, and what was typed here since and is kept by the browser.
  const FIELDS = ['verdict', 'type', 'gravity', 'note'];
  const BLANK = { verdict: '', type: '', gravity: '', note: '' };
  const STORE = 'emberline verdicts ' + location.pathname;
  const same = (a, b) => FIELDS.every(field => (a[field] || '') === (b[field] || ''));
  const isBlank = said => same(said, BLANK);
  const typed = new Map(); // name -> { said, base, exported }
  let storeWorks = true;

  const readStore = () => {
    try {
      const kept = JSON.parse(localStorage.getItem(STORE) || '[]');
      for (const [name, entry] of kept) { typed.set(name, entry); }
    } catch (trouble) {
      storeWorks = false;
    }
  };
  const writeStore = () => {
    try {
      localStorage.setItem(STORE, JSON.stringify([...typed]));
      storeWorks = true;
    } catch (trouble) {
      storeWorks = false;
    }
  };

  objects.forEach(object => {
    object.given = {
      verdict: object.verdict, type: object.verdict_type, gravity: object.verdict_gravity, note: object.verdict_note,
    };
    object.said = object.given;
  });
  readStore();
  // What the run has taken in needs no keeping; what was exported gives way to a verdict that was changed since.
  objects.forEach(object => {
    const entry = typed.get(object.name);
    if (!entry) { return; }
    if (same(entry.said, object.given) || (entry.exported && !same(entry.base, object.given))) {
      typed.delete(object.name);
    } else {
      object.said = entry.said;
    }
  });
  if (storeWorks) { writeStore(); }
  objects.forEach(hold);

  const say = (object, field, value) => {
    const said = { ...object.said, [field]: value };
    object.said = said;
    objects.filter(other => other.name === object.name).forEach(other => { other.said = said; hold(other); });
    if (same(said, object.given)) {
      typed.delete(object.name);
    } else {
      typed.set(object.name, { said, base: object.given, exported: false });
    }
    writeStore();
    tellKept();
  };

  const tellKept = () => {
    const names = new Set(objects.filter(o => !isBlank(o.said)).map(o => o.name));
    typed.forEach((entry, name) => names.add(name));
    const open = [...typed.values()].filter(entry => !entry.exported).length;
    $('export').disabled = names.size === 0;
    $('kept').classList.toggle('unsaved', open > 0);
    $('kept').textContent = !storeWorks && open > 0
      ? `${open} not exported; this browser keeps nothing: export before you leave`
      : open > 0 ? `${open} not exported` : names.size > 0 ? `${names.size} with verdict` : '';
  };

  const csvCell = text => {
    const number = /^[+-](\d+\.?\d*|\.\d+)([eE][+-]?\d{1,3})?$/.test(text);
    const safe = /^[=+\-@\t\r\n\uff1d\uff0b\uff0d\uff20]/.test(text) && !number ? "'" + text : text;
    return /[",\r\n]/.test(safe) || safe !== safe.trim() ? '"' + safe.replace(/"/g, '""') + '"' : safe;
  };

  const exported = () => {
    const lines = ['name,verdict,verdict_type,verdict_gravity,verdict_note'];
    const done = new Set();
    const add = (name, said) => {
      if (!done.has(name)) {
        done.add(name);
        lines.push([name, ...FIELDS.map(field => said[field] || '')].map(csvCell).join(','));
      }
    };
    objects.forEach(object => {
      if (!isBlank(object.said) || typed.has(object.name)) { add(object.name, object.said); }
    });
    typed.forEach((entry, name) => add(name, entry.said)); // of objects that are no longer in the list
    return lines.join('\n') + '\n';
  };

  const saveVerdicts = () => {
    const link = element('a');
    link.href = URL.createObjectURL(new Blob([exported()], { type: 'text/csv;charset=utf-8' }));
    link.download = 'verdicts.csv';
    document.body.append(link);
    link.click();
    link.remove();
    setTimeout(() => URL.revokeObjectURL(link.href), 10000);
    typed.forEach(entry => { entry.exported = true; });
    writeStore();
    tellKept();
  };

