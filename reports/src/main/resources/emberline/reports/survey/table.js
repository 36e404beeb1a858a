  // The table: sorted, filtered, and only the rows in view are in the page.
  const SIGNS = 'ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789-_';
  const ROW = 42;
  const MORE = 6;
  const PRINT = 3000;
  const GRAVITIES = ['FLD-G', 'INT-G', 'VL-G'];
  const scroll = $('scroll');
  const body = $('body');
  let shown = objects.slice();
  let picked = null;
  let region = null;
  let order = { key: 'place', down: false };

  const sparkParts = code => {
    const parts = code.split('~');
    return parts.length === 3
      ? { low: Number(parts[0]), high: Number(parts[1]), signs: parts[2] } : { low: 0.6, high: 2.45, signs: code };
  };
  const spark = code => {
    const { low, high, signs } = sparkParts(code);
    const picture = drawn('svg', {
      class: 'spark', viewBox: `0 0 ${Math.max(1, signs.length - 1)} 64`, preserveAspectRatio: 'none',
      role: 'img', 'aria-label': `spectrum, ${low} to ${high} micron`,
    });
    let path = '';
    let pen = false;
    for (let i = 0; i < signs.length; i++) {
      const level = SIGNS.indexOf(signs[i]);
      if (level < 0) { pen = false; continue; }
      path += (pen ? 'L' : 'M') + i + ' ' + (63 - level);
      pen = true;
    }
    picture.append(drawn('path', { d: path }));
    return picture;
  };

  const address = (object, report) => (report ? 'reports/' : 'objects/') + encodeURIComponent(object.file) + (report ? '.pdf' : '.json');
  const link = (text, object, report) => {
    const made = element('a', text);
    made.href = address(object, report);
    made.tabIndex = -1;
    made.setAttribute('aria-label', `${text} of ${object.name}`);
    return made;
  };
  const calls = object => [object.finalType, object.finalGravity,
    object.finalKind === 'late dwarf' ? object.finalDecision : object.finalKind].filter(Boolean).join(' ')
    || object.reason || object.status;
  const pen = (cell, object, over) => {
    if (over) {
      const mark = element('span', ' \u270e', 'by');
      mark.title = 'by the observer';
      mark.setAttribute('aria-label', 'by the observer');
      cell.append(mark);
    }
  };

  const ranked = KEYS.includes('rank') && objects.some(o => o.rank !== null);
  const COLUMNS = [
    { key: 'place', title: 'Spectrum', width: 108, fill: (cell, o) => {
      const sparks = element('div', null, 'sparks');
      o.sparks.forEach(code => sparks.append(spark(code)));
      cell.append(sparks);
    } },
    { key: 'name', title: 'Name', width: 182, kind: 'name', fill: (cell, o) => { cell.textContent = o.name; cell.title = o.name; } },
    { key: 'finalNumber', title: 'Type', width: 92, kind: 'type', fill: (cell, o) => {
      const own = o.said.type;
      cell.append(element('b', o.finalType || '\u2013'));
      if (!own && o.finalType && o.type_sigma !== null) { cell.append(element('span', ' \u00b1 ' + fixed(o.type_sigma, 1), 'quiet')); }
      pen(cell, o, o.finalType !== o.type || own);
      cell.title = o.finalType !== o.type ? `program: ${o.type || 'no type'}` : o.listed ? `listed as ${o.listed}` : '';
    } },
    { key: 'finalGravity', title: 'Gravity', width: 92, fill: (cell, o) => {
      cell.append(o.finalGravity);
      if (o.finalGravity === o.gravity && o.gravity && o.p_gravity !== null) { cell.append(element('span', ' ' + clean(o.p_gravity), 'quiet')); }
      pen(cell, o, o.finalGravity !== o.gravity);
    } },
    { key: 'finalKind', title: 'Kind', width: 104, fill: (cell, o) => {
      cell.append(o.finalKind || '');
      pen(cell, o, o.finalKind !== o.kind);
      cell.title = o.finalKind !== o.kind ? `program: ${o.kind || 'not judged'}` : o.p_kind === null ? '' : `P = ${clean(o.p_kind)}`;
    } },
    { key: 'finalDecision', title: 'Decision', width: 98, fill: (cell, o) => {
      if (o.finalDecision) {
        const dot = element('i', null, 'decided ' + o.finalDecision);
        dot.setAttribute('aria-hidden', 'true');
        cell.append(dot, o.finalDecision);
      }
      pen(cell, o, o.finalDecision !== o.decision);
    } },
    { key: 'p_substellar', title: 'P(sub)', width: 56, kind: 'right', about: 'probability that it is substellar, by the program', fill: (cell, o) => {
      cell.textContent = o.p_substellar === null ? '' : clean(o.p_substellar);
    } },
    ...(ranked ? [{ key: 'rank', title: 'Rank', width: 52, kind: 'right', fill: (cell, o) => { cell.textContent = o.rank === null ? '' : o.rank; cell.title = o.priority; } }] : []),
    { key: 'score', title: 'Score', width: 56, kind: 'right', first: true, about: 'place in the order of the survey: the greater, the earlier', fill: (cell, o) => {
      cell.textContent = fixed(o.score, 3);
      cell.title = o.priority || '';
    } },
    { key: 'snr', title: 'S/N', width: 50, kind: 'right', fill: (cell, o) => { cell.textContent = o.snr === null ? '' : o.snr < 10 ? fixed(o.snr, 1) : fixed(o.snr, 0); } },
    { key: 'status', title: 'Status', width: 78, fill: (cell, o) => { cell.textContent = o.status; if (o.status === 'failed') { cell.classList.add('failed'); } } },
    { key: 'sorted', title: 'Verdict', width: 92, fill: (cell, o) => {
      const said = [o.said.verdict, o.said.type, o.said.gravity].filter(Boolean).join(', ') || (o.said.note ? 'note' : '');
      cell.textContent = said;
      cell.title = o.said.note || said;
      if (said) { pen(cell, o, true); }
    } },
    { key: 'sentence', title: 'Finding', width: 0, kind: 'sentence', fill: (cell, o) => {
      cell.append(element('div', o.sentence));
      cell.title = o.sentence;
    } },
    { key: 'file', title: 'Files', width: 88, fill: (cell, o) => {
      if (o.report) { cell.append(link('PDF', o, true)); }
      cell.append(link('JSON', o, false));
    } },
  ];

  const head = $('head');
  COLUMNS.forEach(column => {
    const cell = element('th', null, column.kind === 'right' ? 'right' : '');
    cell.scope = 'col';
    if (column.width) { cell.style.setProperty('--wide', column.width + 'px'); }
    cell.dataset.key = column.key;
    cell.dataset.title = column.title;
    const button = element('button', column.title);
    button.type = 'button';
    button.title = column.about || '';
    button.addEventListener('click', () => {
      order = { key: column.key, down: order.key === column.key ? !order.down : Boolean(column.first) };
      scroll.scrollTop = 0;
      refresh();
    });
    cell.append(button);
    head.append(cell);
    column.cell = cell;
  });

  const collator = new Intl.Collator('en', { numeric: true });
  const compare = (a, b) => {
    const x = a[order.key];
    const y = b[order.key];
    const noX = x === null || x === '';
    const noY = y === null || y === '';
    if (noX || noY) { return noX - noY || a.place - b.place; }
    const by = typeof x === 'number' ? x - y : collator.compare(x, y);
    return (order.down ? -by : by) || a.place - b.place;
  };

  const rangeType = code => {
    const match = /^\s*([KMLTY])\s*(\d(?:\.\d*)?)?\s*$/i.exec(code);
    return match ? typeOf(match[1].toUpperCase() + (match[2] || (match[1].toUpperCase() === 'K' ? '5' : '0')).replace(/\.$/, '')) : null;
  };
  const wrong = (id, bad) => {
    $(id).setAttribute('aria-invalid', bad);
    $(id).style.borderColor = bad ? 'var(--accent)' : '';
    $(id).title = bad ? (id === 'signal' ? 'a number is expected' : 'a type is expected, such as M8 or L3.5') : '';
  };
  const wanted = () => {
    const sought = $('words').value.toLowerCase().split(/\s+/).filter(Boolean);
    const from = rangeType($('from').value);
    const to = rangeType($('to').value);
    const least = parseFloat($('signal').value.replace(',', '.'));
    wrong('from', from === null && $('from').value.trim() !== '');
    wrong('to', to === null && $('to').value.trim() !== '');
    wrong('signal', Number.isNaN(least) && $('signal').value.trim() !== '');
    const last = to === null ? null : to + (/\d/.test($('to').value) ? 0.999 : 9.999);
    const among = (id, of) => {
      const value = $(id).value;
      return value === '' ? null : object => of(object) === (value === 'none' ? '' : value);
    };
    const judged = $('judged').value;
    const tests = [
      among('kind', o => o.finalKind), among('gravity', o => o.finalGravity), among('decision', o => o.finalDecision),
      among('status', o => o.status),
      from === null ? null : o => o.finalNumber !== null && o.finalNumber + 0.25 >= from,
      last === null ? null : o => o.finalNumber !== null && o.finalNumber + 0.25 <= last,
      Number.isNaN(least) ? null : o => o.snr !== null && o.snr >= least,
      judged === '' ? null : judged === 'with' ? o => !isBlank(o.said) : judged === 'without' ? o => isBlank(o.said) : o => o.differs,
      region === null ? null : o => region.has(o),
      sought.length === 0 ? null : o => { const text = words(o); return sought.every(word => text.includes(word)); },
    ].filter(Boolean);
    return object => tests.every(test => test(object));
  };

  const makeSpace = () => {
    const row = element('tr', null, 'space');
    row.setAttribute('aria-hidden', 'true');
    const cell = element('td');
    cell.colSpan = COLUMNS.length;
    row.append(cell);
    return row;
  };
  const above = makeSpace();
  const below = makeSpace();
  const remark = text => {
    const row = element('tr', null, 'space');
    const cell = element('td', text, 'empty');
    cell.colSpan = COLUMNS.length;
    row.append(cell);
    return row;
  };
  // What stays is not touched: a row that is taken out, even for a moment, loses the click on it.
  const put = rows => {
    const stay = new Set(rows);
    [...body.children].forEach(row => { if (!stay.has(row)) { row.remove(); } });
    let next = body.firstChild;
    rows.forEach(row => {
      if (row === next) { next = next.nextSibling; } else { body.insertBefore(row, next); }
    });
  };

  // Rows in view are kept; a change of what they say forgets them.
  let made = new Map();
  const filled = object => {
    const row = element('tr', null, 'row');
    row.id = 'row-' + object.place;
    row.dataset.place = object.place;
    COLUMNS.forEach(column => {
      const cell = element('td', null, column.kind);
      cell.setAttribute('role', 'gridcell');
      cell.dataset.key = column.key;
      column.fill(cell, object);
      row.append(cell);
    });
    return row;
  };

  const render = all => {
    const from = all ? 0 : Math.max(0, Math.floor(scroll.scrollTop / ROW) - MORE);
    const to = all ? Math.min(shown.length, PRINT)
      : Math.min(shown.length, Math.ceil((scroll.scrollTop + scroll.clientHeight) / ROW) + MORE);
    const rows = [above];
    const still = new Map();
    above.firstChild.style.height = from * ROW + 'px';
    below.firstChild.style.height = all ? '0' : (shown.length - to) * ROW + 'px';
    for (let i = from; i < to; i++) {
      const object = shown[i];
      const row = made.get(object) || filled(object);
      row.setAttribute('aria-rowindex', i + 2);
      row.setAttribute('aria-selected', object === picked);
      still.set(object, row);
      rows.push(row);
    }
    if (all && to < shown.length) { rows.push(remark(`${shown.length - to} rows more; filter the table to print them.`)); }
    if (shown.length === 0) { rows.push(remark('No object matches.')); }
    rows.push(below);
    put(rows);
    made = still;
    const row = picked && picked.at >= 0 ? 'row-' + picked.place : null;
    if (row && $(row)) { $('table').setAttribute('aria-activedescendant', row); } else { $('table').removeAttribute('aria-activedescendant'); }
  };

