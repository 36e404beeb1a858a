  // The page as a whole: filters, selection, keys, colours, printing.
  const choices = (id, values, none) => {
    const select = $(id);
    const now = select.value;
    select.replaceChildren();
    const add = (text, value) => {
      const choice = element('option', text);
      choice.value = value;
      select.append(choice);
    };
    add('any', '');
    values.forEach(([value, count]) => add(value === '' ? `${none} (${count})` : `${value} (${count})`, value === '' ? 'none' : value));
    select.value = [...select.options].some(option => option.value === now) ? now : '';
  };
  const tally = (of, first) => {
    const counts = new Map((first || []).map(value => [value, 0]));
    objects.forEach(o => counts.set(of(o), (counts.get(of(o)) || 0) + 1));
    return [...counts].filter(([, count]) => count > 0).sort((a, b) => (a[0] === '') - (b[0] === ''));
  };
  const fillFilters = () => {
    choices('kind', tally(o => o.finalKind, Object.keys(GLYPHS)), 'not judged');
    choices('gravity', tally(o => o.finalGravity, GRAVITIES), 'not judged');
    choices('decision', tally(o => o.finalDecision, DECISIONS), 'none');
    choices('status', tally(o => o.status), '');
  };

  const refresh = () => {
    objects.forEach(o => { o.at = -1; });
    shown = objects.filter(wanted()).sort(compare);
    shown.forEach((o, i) => { o.at = i; });
    COLUMNS.forEach(column => {
      if (column.key === order.key) {
        column.cell.setAttribute('aria-sort', order.down ? 'descending' : 'ascending');
      } else {
        column.cell.removeAttribute('aria-sort');
      }
    });
    $('count').textContent = shown.length === objects.length
      ? `${objects.length} objects` : `${shown.length} of ${objects.length} objects`;
    $('region').hidden = region === null;
    if (region !== null) { $('region').textContent = `Frame: ${region.size} \u00d7`; }
    $('table').setAttribute('aria-rowcount', shown.length + 1);
    if (scroll.scrollTop > shown.length * ROW) { scroll.scrollTop = 0; }
    histogram();
    mapPlot.draw();
    diagramPlot.draw();
    render();
  };
  const keepRegion = set => { region = set; refresh(); };

  const facts = () => {
    const place = $('facts');
    const rest = $('more');
    place.replaceChildren();
    rest.replaceChildren();
    $('verdict').hidden = picked === null;
    if (picked === null) {
      place.append(element('h2', 'No object selected'),
        element('p', 'Select a row or a point. Its spectra, finding and your verdict stand here.', 'quiet'));
      return;
    }
    const links = element('span', null, 'links');
    if (picked.report) { links.append(link('PDF', picked, true), ' '); }
    links.append(link('JSON', picked, false));
    links.querySelectorAll('a').forEach(a => { a.tabIndex = 0; });
    place.append(links, element('h2', picked.name));
    picked.sparks.forEach(code => {
      const { low, high } = sparkParts(code);
      const ends = element('div', null, 'of');
      ends.append(element('span', `${low} \u00b5m`), element('span', `${high} \u00b5m`));
      place.append(spark(code), ends);
    });
    place.append(element('p', picked.sentence));
    const more = [
      picked.kind ? `${picked.kind}${picked.p_kind === null ? '' : ` (P ${clean(picked.p_kind)})`}` : '',
      picked.decision ? `${picked.decision} (P(substellar) ${clean(picked.p_substellar)})` : '',
      picked.kin ? `nearest kin: ${picked.kin}` : '',
      picked.listed ? `listed as ${picked.listed}` : '',
      picked.next_step ? `next: ${picked.next_step}` : '',
      picked.status === 'failed' ? '' : picked.reason,
    ].filter(Boolean).join('; ');
    if (more) { rest.append(element('p', more + (/[.!?]$/.test(more) ? '' : '.'), 'quiet')); }
    if (picked.cautions.length > 0) {
      const list = element('ul');
      cautionsOf(picked).forEach(text => list.append(text.startsWith('!')
        ? element('li', text.slice(1), 'warning') : element('li', text)));
      rest.append(list);
    }
    $('call').value = picked.said.verdict || '';
    $('said-type').value = picked.said.type || '';
    $('said-gravity').value = picked.said.gravity || '';
    $('note').value = picked.said.note || '';
    tellSaid();
  };
  const tellSaid = () => {
    const program = [picked.type, picked.gravity, picked.kind, picked.decision].filter(Boolean).join(', ');
    $('said').textContent = isBlank(picked.said) ? ''
      : (picked.differs ? `Overrides the program (${program || 'no call'}). ` : '')
        + (typed.has(picked.name) ? 'Kept by this browser; export it to take it back with sort \u2011\u2011verdicts.' : 'Taken in by the run.');
  };

  const pick = (object, jump) => {
    if (!object) { return; }
    picked = object;
    if (object.at >= 0 && jump) {
      const top = object.at * ROW;
      const room = scroll.clientHeight - 32;
      if (top < scroll.scrollTop) { scroll.scrollTop = top; }
      if (top + ROW > scroll.scrollTop + room) { scroll.scrollTop = top + ROW - room; }
    }
    render();
    mapPlot.mark();
    diagramPlot.mark();
    facts();
    history.replaceState(null, '', '#' + encodeURIComponent(object.file));
  };
  const open = () => {
    if (picked) { window.open(address(picked, picked.report)); }
  };

  data.calls.forEach(word => {
    const choice = element('option', word);
    choice.value = word;
    $('call').append(choice);
  });
  const told = (id, field) => {
    $(id).addEventListener(/SELECT/.test($(id).tagName) ? 'change' : 'input', () => {
      if (!picked) { return; }
      say(picked, field, $(id).value.trim());
      made = new Map();
      tellSaid();
      if (field !== 'note') {
        fillFilters();
        legend();
        histogram();
        mapPlot.draw();
        setDiagram(false);
      }
      render();
    });
  };
  told('call', 'verdict');
  told('said-type', 'type');
  told('said-gravity', 'gravity');
  told('note', 'note');
  $('verdict').addEventListener('submit', event => event.preventDefault());
  $('export').addEventListener('click', saveVerdicts);
  window.addEventListener('beforeunload', event => {
    if (!storeWorks && [...typed.values()].some(entry => !entry.exported)) { event.preventDefault(); }
  });

  body.addEventListener('click', event => {
    const row = event.target.closest('tr.row');
    if (row && !event.target.closest('a')) { pick(objects[Number(row.dataset.place)], false); }
  });
  body.addEventListener('dblclick', event => {
    if (event.target.closest('tr.row') && !event.target.closest('a')) { open(); }
  });
  const leave = () => {
    document.activeElement.blur();
    $('table').focus({ preventScroll: true });
  };
  document.addEventListener('keydown', event => {
    const active = document.activeElement;
    const typing = /^(INPUT|SELECT|TEXTAREA)$/.test(active.tagName);
    if (event.ctrlKey || event.metaKey || event.altKey) { return; }
    if (event.key === 'Escape') {
      if (typing) { leave(); return; }
      $('tools').reset();
      return;
    }
    if (typing) {
      if (active.closest('#tools') && event.key === 'Enter' && active.tagName === 'INPUT') {
        event.preventDefault();
        leave();
        pick(picked && picked.at >= 0 ? picked : shown[0], true);
      }
      return;
    }
    const page = Math.max(1, Math.floor(scroll.clientHeight / ROW) - 2);
    const at = picked && picked.at >= 0 ? picked.at : -1;
    const moves = {
      ArrowDown: at + 1, ArrowUp: at - 1, PageDown: at + page, PageUp: at - page, Home: 0, End: shown.length - 1,
    };
    if (event.key in moves) {
      event.preventDefault();
      pick(shown[Math.max(0, Math.min(shown.length - 1, moves[event.key]))], true);
    } else if (event.key === '/') {
      event.preventDefault();
      $('words').focus();
      $('words').select();
    } else if ((event.key === 'v' || event.key === 'n') && picked) {
      event.preventDefault();
      $(event.key === 'v' ? 'call' : 'note').focus();
    } else if (event.key === 'Enter' && !/^(BUTTON|A)$/.test(active.tagName)) {
      open();
    }
  });
  let soon = 0;
  ['words', 'from', 'to', 'signal'].forEach(id => $(id).addEventListener('input', () => {
    clearTimeout(soon);
    soon = setTimeout(refresh, objects.length > 2000 ? 120 : 0);
  }));
  ['kind', 'gravity', 'decision', 'status', 'judged'].forEach(id => $(id).addEventListener('change', refresh));
  $('region').addEventListener('click', () => keepRegion(null));
  $('tools').addEventListener('submit', event => event.preventDefault());
  $('tools').addEventListener('reset', () => { region = null; setTimeout(refresh); });
  $('plane').addEventListener('change', setMap);
  ['across', 'up'].forEach(id => $(id).addEventListener('change', setDiagram));
  let waiting = false;
  scroll.addEventListener('scroll', () => {
    if (!waiting) {
      waiting = true;
      requestAnimationFrame(() => { waiting = false; render(); });
    }
  });

  const THEMES = ['system', 'light', 'dark'];
  const dark = window.matchMedia('(prefers-color-scheme: dark)');
  let theme = 'system';
  try { theme = localStorage.getItem('emberline colours') || 'system'; } catch (trouble) { /* then the system decides */ }
  const paint = now => {
    document.documentElement.dataset.theme = now || (theme === 'system' ? (dark.matches ? 'dark' : 'light') : theme);
    $('theme').textContent = 'Colours: ' + theme;
    $('theme').setAttribute('aria-label', theme === 'system' ? 'Colours: as the system' : 'Colours: ' + theme);
    readShades();
    legend();
  };
  $('theme').addEventListener('click', () => {
    theme = THEMES[(THEMES.indexOf(theme) + 1) % THEMES.length];
    try { localStorage.setItem('emberline colours', theme); } catch (trouble) { /* then it holds for this visit */ }
    paint();
    histogram();
    mapPlot.draw();
    diagramPlot.draw();
  });
  const redraw = () => { histogram(); mapPlot.draw(); diagramPlot.draw(); render(); };
  dark.addEventListener('change', () => { paint(); redraw(); });
  window.addEventListener('resize', redraw);
  window.addEventListener('beforeprint', () => {
    paint('light');
    histogram();
    mapPlot.draw(3);
    diagramPlot.draw(3);
    render(true);
  });
  window.addEventListener('afterprint', () => { paint(); redraw(); });

  $('summary').textContent = objects.length + (objects.length === 1 ? ' object: ' : ' objects: ')
    + tally(o => o.status).map(([status, count]) => `${count} ${status}`).join(', ');
  paint();
  fillFilters();
  setMap(true);
  setDiagram(true);
  refresh();
  facts();
  tellKept();
  let asked = '';
  try { asked = decodeURIComponent(location.hash.slice(1)); } catch (trouble) { /* a broken address selects nothing */ }
  if (asked) { pick(objects.find(o => o.file === asked), true); }
  document.documentElement.dataset.ready = 'yes';
  performance.mark('ready');
})();
