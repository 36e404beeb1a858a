'use strict';
(() => {
  const SIGNS = 'ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789-_';
  const CLASSES = 'MLTY';
  const ROW = 44;
  const MORE = 8;
  const PRINT = 3000;
  const GRAVITIES = ['FLD-G', 'INT-G', 'VL-G'];
  const TONES = { 'FLD-G': 'field', 'INT-G': 'intermediate', 'VL-G': 'verylow', '': 'none' };
  const $ = id => document.getElementById(id);
  const data = JSON.parse($('data').textContent);
  const KEYS = data.keys;
  const objects = data.rows.map((cells, place) => {
    const object = { place };
    KEYS.forEach((key, i) => { object[key] = cells[i]; });
    object.words = [object.name, object.status, object.reason, object.type, object.gravity,
      object.findings, object.listed].join(' ').toLowerCase();
    return object;
  });
  let shown = objects.slice();
  let picked = -1;
  let order = { key: 'place', down: false };

  const element = (tag, text, kind) => {
    const made = document.createElement(tag);
    if (text !== undefined && text !== null) { made.textContent = text; }
    if (kind) { made.className = kind; }
    return made;
  };
  const drawn = (tag, attributes) => {
    const made = document.createElementNS('http://www.w3.org/2000/svg', tag);
    for (const [name, value] of Object.entries(attributes)) { made.setAttribute(name, value); }
    return made;
  };

  const spark = code => {
    const picture = drawn('svg', {
      class: 'spark', viewBox: `0 0 ${Math.max(1, code.length - 1)} 64`,
      preserveAspectRatio: 'none', role: 'img', 'aria-label': 'spectrum',
    });
    let path = '';
    let pen = false;
    for (let i = 0; i < code.length; i++) {
      const level = SIGNS.indexOf(code[i]);
      if (level < 0) { pen = false; continue; }
      path += (pen ? 'L' : 'M') + i + ' ' + (63 - level);
      pen = true;
    }
    picture.append(drawn('path', { d: path }));
    return picture;
  };

  const link = (text, folder, object, ending) => {
    const made = element('a', text);
    made.href = folder + '/' + encodeURIComponent(object.file) + ending;
    made.tabIndex = -1;
    made.setAttribute('aria-label', text + ' of ' + object.name);
    return made;
  };

  const fixed = (number, digits) => number === null ? '' : number.toFixed(digits);

  const COLUMNS = [
    { key: 'place', title: 'Spectrum', width: '168px', fill: (cell, o) => cell.append(spark(o.spark)) },
    { key: 'name', title: 'Name', width: '220px', kind: 'name', fill: (cell, o) => { cell.textContent = o.name; cell.title = o.name; } },
    { key: 'type_number', title: 'Type', width: '132px', kind: 'type', fill: (cell, o) => {
      cell.append(element('b', o.type || '\u2013'));
      if (o.type_sigma !== null) { cell.append(element('span', ' \u00b1 ' + fixed(o.type_sigma, 1), 'quiet')); }
    } },
    { key: 'listed', title: 'Listed', width: '100px', kind: 'quiet', fill: (cell, o) => { cell.textContent = o.listed; cell.title = o.listed; } },
    { key: 'gravity', title: 'Gravity', width: '128px', fill: (cell, o) => {
      if (!o.gravity) { return; }
      const swatch = element('i', '', 'swatch');
      swatch.style.background = `var(--${TONES[o.gravity]})`;
      cell.append(swatch, o.gravity, element('span', o.p_gravity > 0.99 ? ' >0.99' : ' ' + fixed(o.p_gravity, 2), 'quiet'));
    } },
    { key: 'snr', title: 'S/N', width: '72px', kind: 'right', fill: (cell, o) => { cell.textContent = o.snr === null ? '' : o.snr < 10 ? fixed(o.snr, 1) : fixed(o.snr, 0); } },
    { key: 'resolution', title: 'R', width: '72px', kind: 'right', fill: (cell, o) => { cell.textContent = fixed(o.resolution, 0); } },
    { key: 'status', title: 'Status', width: '96px', fill: (cell, o) => { cell.textContent = o.status; if (o.status === 'failed') { cell.classList.add('failed'); } } },
    { key: 'findings', title: 'Findings', width: 'auto', kind: 'quiet', fill: (cell, o) => { cell.textContent = o.reason || o.findings; cell.title = o.reason || o.findings; } },
    { key: 'file', title: 'Files', width: '112px', fill: (cell, o) => {
      if (o.report) { cell.append(link('PDF', 'reports', o, '.pdf')); }
      cell.append(link('JSON', 'objects', o, '.json'));
    } },
  ];

  const head = $('head');
  COLUMNS.forEach(column => {
    const cell = element('th', null, column.kind === 'right' ? 'right' : '');
    cell.scope = 'col';
    cell.style.width = column.width;
    const button = element('button', column.title);
    button.type = 'button';
    button.addEventListener('click', () => {
      order = { key: column.key, down: order.key === column.key ? !order.down : false };
      refresh();
    });
    cell.append(button);
    head.append(cell);
    column.cell = cell;
  });

  const compare = (a, b) => {
    const x = a[order.key];
    const y = b[order.key];
    const noX = x === null || x === '';
    const noY = y === null || y === '';
    if (noX || noY) { return noX - noY || a.place - b.place; }
    const sign = order.down ? -1 : 1;
    const by = typeof x === 'number' ? x - y : String(x).localeCompare(String(y), 'en', { numeric: true });
    return sign * by || a.place - b.place;
  };

  const typeNumber = code => {
    const match = /^\s*([KMLTY])\s*(\d(?:\.\d*)?)?\s*$/i.exec(code);
    if (!match) { return null; }
    const letter = match[1].toUpperCase();
    const sub = match[2] ? Number(match[2]) : 0;
    return letter === 'K' ? -1 + (sub - 7) / 2 : CLASSES.indexOf(letter) * 10 + sub;
  };
  const typeCode = number => number < 0 ? 'K' : CLASSES[Math.min(3, Math.floor(number / 10))] + number % 10;

  const wanted = () => {
    const words = $('words').value.toLowerCase().split(/\s+/).filter(Boolean);
    const from = typeNumber($('from').value);
    const to = typeNumber($('to').value);
    const whole = !/\d/.test($('to').value);
    const gravity = $('gravity').value;
    const status = $('status').value;
    const last = to === null ? null : to + (whole ? 10 : 0.999);
    return object => words.every(word => object.words.includes(word))
      && (from === null || (object.type_number !== null && object.type_number >= from))
      && (last === null || (object.type_number !== null && object.type_number <= last))
      && (!gravity || object.gravity === (gravity === 'none' ? '' : gravity))
      && (!status || object.status === status);
  };

  const scroll = $('scroll');
  const body = $('body');
  const refresh = () => {
    const chosen = picked >= 0 ? shown[picked] : null;
    shown = objects.filter(wanted()).sort(compare);
    picked = chosen ? shown.indexOf(chosen) : -1;
    COLUMNS.forEach(column => {
      if (column.key === order.key) {
        column.cell.setAttribute('aria-sort', order.down ? 'descending' : 'ascending');
      } else {
        column.cell.removeAttribute('aria-sort');
      }
    });
    $('count').textContent = shown.length === objects.length
      ? `${objects.length} objects` : `${shown.length} of ${objects.length} objects`;
    $('table').setAttribute('aria-rowcount', shown.length + 1);
    if (scroll.scrollTop > shown.length * ROW) { scroll.scrollTop = 0; }
    histogram();
    render();
    detail();
  };

  const space = (height, parent) => {
    const row = element('tr', null, 'space');
    const cell = element('td');
    cell.colSpan = COLUMNS.length;
    cell.style.height = height + 'px';
    row.append(cell);
    parent.append(row);
  };

  const render = all => {
    const from = all ? 0 : Math.max(0, Math.floor(scroll.scrollTop / ROW) - MORE);
    const to = all ? Math.min(shown.length, PRINT)
      : Math.min(shown.length, Math.ceil((scroll.scrollTop + scroll.clientHeight) / ROW) + MORE);
    const rows = document.createDocumentFragment();
    if (from > 0) { space(from * ROW, rows); }
    for (let i = from; i < to; i++) {
      const object = shown[i];
      const row = element('tr', null, 'row');
      row.setAttribute('aria-rowindex', i + 2);
      row.setAttribute('aria-selected', i === picked);
      row.dataset.index = i;
      COLUMNS.forEach(column => {
        const cell = element('td', null, column.kind);
        column.fill(cell, object);
        row.append(cell);
      });
      rows.append(row);
    }
    if (!all && to < shown.length) { space((shown.length - to) * ROW, rows); }
    if (shown.length === 0) {
      const row = element('tr', null, 'space');
      const cell = element('td', 'No object matches.', 'empty');
      cell.colSpan = COLUMNS.length;
      row.append(cell);
      rows.append(row);
    }
    body.replaceChildren(rows);
  };

  const histogram = () => {
    const picture = $('histogram');
    const wide = Math.max(320, picture.clientWidth || 900);
    const tall = 92;
    picture.setAttribute('viewBox', `0 0 ${wide} ${tall}`);
    const typed = objects.filter(o => o.type_number !== null);
    picture.replaceChildren();
    if (typed.length === 0) { return; }
    const bin = o => Math.max(-1, Math.floor(o.type_number + 0.25));
    const first = typed.reduce((least, o) => Math.min(least, bin(o)), 99);
    const last = typed.reduce((most, o) => Math.max(most, bin(o)), -99) + 1;
    const counts = new Map();
    const visible = new Set(shown);
    typed.forEach(o => {
      const key = bin(o);
      const count = counts.get(key) || { all: 0, parts: {} };
      count.all++;
      if (visible.has(o)) { count.parts[o.gravity] = (count.parts[o.gravity] || 0) + 1; }
      counts.set(key, count);
    });
    const highest = Math.max(...[...counts.values()].map(c => c.all));
    const step = wide / (last - first);
    const floor = tall - 17;
    picture.append(drawn('line', { class: 'axis', x1: 0, x2: wide, y1: floor + .5, y2: floor + .5 }));
    for (let type = first; type < last; type++) {
      const x = (type - first) * step;
      if (step > 26 || type % 5 === 0) {
        const label = drawn('text', { x: x + step / 2, y: tall - 4, 'text-anchor': 'middle' });
        label.textContent = typeCode(type);
        picture.append(label);
      }
      const count = counts.get(type);
      if (!count) { continue; }
      const scale = (floor - 4) / highest;
      const group = drawn('g', { class: 'bar' });
      const title = drawn('title', {});
      const number = Object.values(count.parts).reduce((sum, part) => sum + part, 0);
      title.textContent = `${typeCode(type)}: ${number} of ${count.all}`;
      group.append(title);
      const box = (y, height, tone, opacity) => group.append(drawn('rect', {
        x: x + 1, width: Math.max(1, step - 2), y, height, fill: `var(--${tone})`, opacity,
      }));
      box(floor - count.all * scale, count.all * scale, 'wash', 1);
      let y = floor;
      ['', ...GRAVITIES].forEach(gravity => {
        const part = (count.parts[gravity] || 0) * scale;
        if (part > 0) { y -= part; box(y, part, TONES[gravity], 1); }
      });
      group.addEventListener('click', () => {
        const code = typeCode(type);
        const same = $('from').value === code && $('to').value === code;
        $('from').value = same ? '' : code;
        $('to').value = same ? '' : code;
        refresh();
      });
      picture.append(group);
    }
  };

  const detail = () => {
    const object = shown[picked];
    const place = $('detail');
    place.replaceChildren();
    if (!object) {
      place.append(element('span', 'Select a row to see its findings.', 'quiet'));
      return;
    }
    place.append(element('b', object.name));
    if (object.type) {
      place.append(` ${object.type}, 95% from ${fixed(object.type_lo95, 1)} to ${fixed(object.type_hi95, 1)}`);
    }
    place.append(element('br'));
    place.append(element('span', [object.reason, object.findings].filter(Boolean).join(' · '), 'quiet'));
  };

  const pick = (index, jump) => {
    if (shown.length === 0) { return; }
    picked = Math.max(0, Math.min(shown.length - 1, index));
    const top = picked * ROW;
    const room = scroll.clientHeight - 34;
    if (jump && top < scroll.scrollTop) { scroll.scrollTop = top; }
    if (jump && top + ROW > scroll.scrollTop + room) { scroll.scrollTop = top + ROW - room; }
    render();
    detail();
    history.replaceState(null, '', '#' + encodeURIComponent(shown[picked].file));
  };

  const open = () => {
    const object = shown[picked];
    if (object) {
      const folder = object.report ? 'reports/' : 'objects/';
      window.open(folder + encodeURIComponent(object.file) + (object.report ? '.pdf' : '.json'));
    }
  };

  body.addEventListener('click', event => {
    const row = event.target.closest('tr.row');
    if (row && !event.target.closest('a')) { pick(Number(row.dataset.index), false); }
  });
  body.addEventListener('dblclick', event => { if (event.target.closest('tr.row')) { open(); } });
  document.addEventListener('keydown', event => {
    const typing = /^(INPUT|SELECT)$/.test(document.activeElement.tagName);
    if (event.ctrlKey || event.metaKey || event.altKey) { return; }
    if (event.key === 'Escape') {
      $('tools').reset();
      document.activeElement.blur();
      refresh();
      return;
    }
    if (typing) {
      if (event.key === 'Enter' || (event.key === 'ArrowDown' && document.activeElement.id === 'words')) {
        event.preventDefault();
        document.activeElement.blur();
        pick(Math.max(0, picked), true);
      }
      return;
    }
    const page = Math.max(1, Math.floor(scroll.clientHeight / ROW) - 2);
    const moves = {
      ArrowDown: picked + 1, ArrowUp: picked - 1, PageDown: picked + page, PageUp: picked - page,
      Home: 0, End: shown.length - 1,
    };
    if (event.key in moves) {
      event.preventDefault();
      pick(moves[event.key], true);
    } else if (event.key === '/') {
      event.preventDefault();
      $('words').focus();
      $('words').select();
    } else if (event.key === 'Enter' && document.activeElement.tagName !== 'BUTTON' && document.activeElement.tagName !== 'A') {
      open();
    }
  });
  ['words', 'from', 'to'].forEach(id => $(id).addEventListener('input', refresh));
  ['gravity', 'status'].forEach(id => $(id).addEventListener('change', refresh));
  $('tools').addEventListener('submit', event => event.preventDefault());
  $('tools').addEventListener('reset', () => setTimeout(refresh));
  let waiting = false;
  scroll.addEventListener('scroll', () => {
    if (!waiting) {
      waiting = true;
      requestAnimationFrame(() => { waiting = false; render(); });
    }
  });
  window.addEventListener('resize', () => { histogram(); render(); });
  window.addEventListener('beforeprint', () => render(true));
  window.addEventListener('afterprint', () => render());

  const counts = {};
  objects.forEach(o => { counts[o.status] = (counts[o.status] || 0) + 1; });
  Object.keys(counts).forEach(status => {
    const choice = element('option', `${status} (${counts[status]})`);
    choice.value = status;
    $('status').append(choice);
  });
  $('summary').prepend(objects.length + (objects.length === 1 ? ' object: ' : ' objects: ')
    + Object.entries(counts).map(([status, n]) => `${n} ${status}`).join(', ') + '. ');
  refresh();
  const wantedFile = decodeURIComponent(location.hash.slice(1));
  const at = wantedFile ? shown.findIndex(o => o.file === wantedFile) : -1;
  if (at >= 0) { pick(at, true); }
})();
