  // Histogram, map and diagram. Points of objects select rows; reference objects lie underneath.
  const GLYPHS = {
    'late dwarf': 'disc', giant: 'square', 'early star': 'diamond', 'carbon star': 'cross',
    'reddened background': 'triangle', extragalactic: 'plus', 'unlike known': 'star', '': 'hoop',
  };
  const STOPS = [[0, '--m'], [10, '--l'], [20, '--t'], [30, '--y']];
  let shades = {};

  const readShades = () => {
    const style = getComputedStyle(document.documentElement);
    mixed.clear();
    shades = { ramp: STOPS.map(([at, name]) => [at, hex(style.getPropertyValue(name))]) };
    ['ink', 'quiet', 'rule', 'accent', 'under', 'other', 'card'].forEach(name => {
      shades[name] = style.getPropertyValue('--' + name).trim();
    });
  };
  const hex = text => [1, 3, 5].map(i => parseInt(text.trim().slice(i, i + 2), 16));
  const mixed = new Map();
  const shadeOf = type => {
    const step = Math.round(type * 4);
    if (!mixed.has(step)) { mixed.set(step, mix(step / 4)); }
    return mixed.get(step);
  };
  const mix = type => {
    const ramp = shades.ramp;
    const t = Math.max(ramp[0][0], Math.min(ramp[ramp.length - 1][0], type));
    let i = 0;
    while (i < ramp.length - 2 && t > ramp[i + 1][0]) { i++; }
    const share = (t - ramp[i][0]) / (ramp[i + 1][0] - ramp[i][0]);
    const parts = ramp[i][1].map((low, k) => Math.round(low + share * (ramp[i + 1][1][k] - low)));
    return `rgb(${parts.join(',')})`;
  };

  const traceGlyph = (pen, glyph, x, y, r) => {
    const line = (...points) => points.forEach(([dx, dy], i) => pen[i ? 'lineTo' : 'moveTo'](x + dx * r, y + dy * r));
    pen.beginPath();
    switch (glyph) {
      case 'square': line([-.9, -.9], [.9, -.9], [.9, .9], [-.9, .9]); pen.closePath(); break;
      case 'diamond': line([0, -1.25], [1.25, 0], [0, 1.25], [-1.25, 0]); pen.closePath(); break;
      case 'triangle': line([0, -1.2], [1.15, .9], [-1.15, .9]); pen.closePath(); break;
      case 'cross': line([-1, -1], [1, 1]); line([1, -1], [-1, 1]); break;
      case 'plus': line([0, -1.25], [0, 1.25]); line([-1.25, 0], [1.25, 0]); break;
      case 'star': line([0, -1.3], [0, 1.3]); line([-1.1, -.65], [1.1, .65]); line([1.1, -.65], [-1.1, .65]); break;
      default: pen.arc(x, y, r, 0, 2 * Math.PI);
    }
  };
  const LINES = ['cross', 'plus', 'star', 'hoop'];
  const paintGlyph = (pen, kind, type, x, y, r, plain) => {
    const glyph = kind === 'late dwarf' && type === null ? 'hoop' : GLYPHS[kind] || 'hoop';
    const shade = kind === 'unlike known' ? shades.accent
      : type !== null && (kind === 'late dwarf' || kind === '') ? shadeOf(type) : shades.other;
    traceGlyph(pen, glyph, x, y, r);
    if (LINES.includes(glyph)) {
      pen.strokeStyle = shade;
      pen.lineWidth = 1.5;
      pen.stroke();
    } else {
      pen.fillStyle = shade;
      pen.fill();
      if (!plain) {
        pen.strokeStyle = shades.card;
        pen.lineWidth = 0.6;
        pen.stroke();
      }
    }
  };

  const ticksOf = (low, high, most) => {
    const rough = (high - low) / most || 1;
    const power = 10 ** Math.floor(Math.log10(rough));
    const step = [1, 2, 5, 10].map(f => f * power).find(s => s >= rough * 0.999);
    const ticks = [];
    for (let t = Math.ceil(low / step); t * step <= high + 1e-9 * step; t++) { ticks.push(t * step); }
    return { ticks, digits: Math.max(0, -Math.floor(Math.log10(step) + 1e-9)) };
  };

  const span = numbers => {
    let low = Infinity;
    let high = -Infinity;
    numbers.forEach(n => { if (n < low) { low = n; } if (n > high) { high = n; } });
    if (low > high) { return [0, 1]; }
    const room = (high - low) * 0.05 || 0.5;
    return [low - room, high + room];
  };

  // A plot of points: spots {object, x, y}, under {x, y, ...}, across/up {title, type, bare}.
  const makePlot = id => {
    const box = $(id).querySelector('.plot');
    const canvas = box.querySelector('canvas');
    const top = box.querySelector('svg');
    const plot = { spots: [], under: [], across: {}, up: {}, empty: '' };
    let frame = null;
    let start = null;

    const place = () => {
      const wide = box.clientWidth;
      const tall = box.clientHeight;
      const left = plot.up.bare ? 6 : 46;
      const foot = plot.across.bare ? 6 : 30;
      const all = plot.spots.concat(plot.under);
      frame = { wide, tall, left, foot, x: span(all.map(s => s.x)), y: span(all.map(s => s.y)) };
      plot.px = x => left + (x - frame.x[0]) / (frame.x[1] - frame.x[0]) * (wide - left - 8);
      plot.py = y => tall - foot - (y - frame.y[0]) / (frame.y[1] - frame.y[0]) * (tall - foot - 8);
    };

    const drawAxis = (pen, axis, low, high, along) => {
      if (axis.bare) { return; }
      const { ticks, digits } = ticksOf(low, high, along === 'x' ? Math.max(2, frame.wide / 70) : Math.max(2, frame.tall / 40));
      pen.fillStyle = shades.quiet;
      pen.strokeStyle = shades.rule;
      pen.lineWidth = 1;
      pen.font = '11px "DejaVu Sans Condensed", "Segoe UI", Arial, sans-serif';
      ticks.forEach(t => {
        const label = axis.type ? typeCode(t) : t.toFixed(digits).replace('-', '\u2212');
        pen.beginPath();
        if (along === 'x') {
          const x = Math.round(plot.px(t)) + .5;
          pen.moveTo(x, 8); pen.lineTo(x, frame.tall - frame.foot); pen.stroke();
          pen.textAlign = 'center';
          pen.fillText(label, x, frame.tall - frame.foot + 13);
        } else {
          const y = Math.round(plot.py(t)) + .5;
          pen.moveTo(frame.left, y); pen.lineTo(frame.wide - 8, y); pen.stroke();
          pen.textAlign = 'right';
          pen.fillText(label, frame.left - 5, y + 4);
        }
      });
      pen.textAlign = 'center';
      pen.fillStyle = shades.ink;
      if (along === 'x') {
        pen.fillText(axis.title, (frame.left + frame.wide) / 2, frame.tall - 3);
      } else {
        pen.save();
        pen.translate(10, (frame.tall - frame.foot) / 2);
        pen.rotate(-Math.PI / 2);
        pen.fillText(axis.title, 0, 0);
        pen.restore();
      }
    };

    plot.draw = sharp => {
      place();
      const ratio = sharp || Math.min(3, window.devicePixelRatio || 1);
      canvas.width = Math.max(1, frame.wide * ratio);
      canvas.height = Math.max(1, frame.tall * ratio);
      const pen = canvas.getContext('2d');
      pen.scale(ratio, ratio);
      drawAxis(pen, plot.across, frame.x[0], frame.x[1], 'x');
      drawAxis(pen, plot.up, frame.y[0], frame.y[1], 'y');
      pen.fillStyle = shades.under;
      pen.globalAlpha = .5;
      plot.under.forEach(s => {
        pen.beginPath();
        pen.arc(plot.px(s.x), plot.py(s.y), 1.6, 0, 2 * Math.PI);
        pen.fill();
      });
      const r = plot.spots.length > 2000 ? 2.2 : plot.spots.length > 300 ? 3 : 4;
      pen.globalAlpha = .13;
      plot.spots.forEach(s => {
        if (s.object.at < 0) { paintGlyph(pen, s.object.finalKind, s.object.finalNumber, plot.px(s.x), plot.py(s.y), r * .8, true); }
      });
      pen.globalAlpha = 1;
      plot.spots.forEach(s => {
        if (s.object.at >= 0) { paintGlyph(pen, s.object.finalKind, s.object.finalNumber, plot.px(s.x), plot.py(s.y), r, plot.spots.length > 2000); }
      });
      if (plot.spots.length === 0) {
        pen.fillStyle = shades.quiet;
        pen.textAlign = 'center';
        pen.font = '12px "DejaVu Sans Condensed", "Segoe UI", Arial, sans-serif';
        pen.fillText(plot.empty, frame.wide / 2, frame.tall / 2);
      }
      if (sharp) { paintOdd(pen); }
      plot.mark();
    };

    // The objects unlike all others, with a name where there is room for it.
    const namedOdd = () => {
      const taken = [];
      return (plot.odd || []).map(s => {
        const x = plot.px(s.x);
        const y = plot.py(s.y);
        const room = s.object.name.length < 26 && !taken.some(t => Math.abs(t - y) < 12);
        if (room) { taken.push(y); }
        return { x, y, left: x > frame.wide * .6, name: room ? s.object.name : '' };
      });
    };

    // On paper they are part of the picture, so that rings and points cannot come apart.
    const paintOdd = pen => {
      pen.strokeStyle = shades.accent;
      pen.lineWidth = 1.2;
      pen.font = '11px "DejaVu Sans Condensed", "Segoe UI", Arial, sans-serif';
      namedOdd().forEach(({ x, y, left, name }) => {
        pen.beginPath();
        pen.arc(x, y, 7, 0, 2 * Math.PI);
        pen.stroke();
        pen.fillStyle = shades.accent;
        pen.textAlign = left ? 'right' : 'left';
        pen.fillText(name, x + (left ? -10 : 10), y + 4);
      });
    };

    // What changes with the selection is drawn over the points.
    plot.mark = () => {
      top.replaceChildren();
      top.setAttribute('viewBox', `0 0 ${frame.wide} ${frame.tall}`);
      namedOdd().forEach(({ x, y, left, name }) => {
        top.append(drawn('circle', { class: 'ring', cx: x, cy: y, r: 7, 'stroke-width': 1.2, style: 'stroke-width:1.2' }));
        if (name) {
          const label = drawn('text', { class: 'odd', x: x + (left ? -10 : 10), y: y + 4, 'text-anchor': left ? 'end' : 'start' });
          label.textContent = name;
          top.append(label);
        }
      });
      const spot = plot.spots.find(s => s.object === picked);
      if (spot) {
        top.append(drawn('circle', { class: 'ring picked', cx: plot.px(spot.x), cy: plot.py(spot.y), r: 9 }));
      }
    };

    const near = (event, reach) => {
      const box2 = canvas.getBoundingClientRect();
      const x = event.clientX - box2.left;
      const y = event.clientY - box2.top;
      let best = null;
      let least = reach * reach;
      [s => s.object && s.object.at >= 0, s => s.object, () => true].some(fits => {
        plot.spots.concat(plot.under).forEach(s => {
          if (!fits(s)) { return; }
          const d = (plot.px(s.x) - x) ** 2 + (plot.py(s.y) - y) ** 2;
          if (d < least) { least = d; best = s; }
        });
        return best;
      });
      return best;
    };

    const corner = event => {
      const box2 = canvas.getBoundingClientRect();
      return [event.clientX - box2.left, event.clientY - box2.top];
    };
    canvas.addEventListener('pointerdown', event => {
      start = corner(event);
      canvas.setPointerCapture(event.pointerId);
    });
    canvas.addEventListener('pointermove', event => {
      const [x, y] = corner(event);
      if (start && Math.hypot(x - start[0], y - start[1]) > 6) {
        hideTip();
        plot.mark();
        top.append(drawn('rect', {
          class: 'frame', x: Math.min(x, start[0]), y: Math.min(y, start[1]),
          width: Math.abs(x - start[0]), height: Math.abs(y - start[1]),
        }));
        return;
      }
      const spot = near(event, 12);
      if (spot) {
        showTip(event, spot.object ? `${spot.object.name}: ${calls(spot.object)}`
          : `reference: ${spot.name}, ${[spot.type, spot.gravity, spot.kind].filter(Boolean).join(' ')} (${spot.source})`);
      } else {
        hideTip();
      }
    });
    canvas.addEventListener('pointerup', event => {
      const from = start;
      start = null;
      if (!from) { return; }
      const [x, y] = corner(event);
      if (Math.hypot(x - from[0], y - from[1]) > 6) {
        const within = s => plot.px(s.x) >= Math.min(x, from[0]) && plot.px(s.x) <= Math.max(x, from[0])
          && plot.py(s.y) >= Math.min(y, from[1]) && plot.py(s.y) <= Math.max(y, from[1]);
        const inside = plot.spots.filter(within).map(s => s.object);
        if (inside.length > 0) { keepRegion(new Set(inside)); } else { plot.mark(); }
        return;
      }
      const spot = near(event, 14);
      if (spot && spot.object) { pick(spot.object, true); }
    });
    canvas.addEventListener('pointerleave', hideTip);
    canvas.addEventListener('dblclick', () => open());
    canvas.addEventListener('keydown', event => {
      const way = { ArrowRight: [1, 0], ArrowLeft: [-1, 0], ArrowUp: [0, -1], ArrowDown: [0, 1] }[event.key];
      if (!way || event.ctrlKey || event.metaKey || event.altKey) { return; }
      event.preventDefault();
      event.stopPropagation();
      const now = plot.spots.find(s => s.object === picked);
      let best = null;
      let least = Infinity;
      plot.spots.forEach(s => {
        if (s === now || s.object.at < 0) { return; }
        if (!now) { best = best || s; return; }
        const dx = plot.px(s.x) - plot.px(now.x);
        const dy = plot.py(s.y) - plot.py(now.y);
        const ahead = dx * way[0] + dy * way[1];
        const aside = Math.abs(dx * way[1]) + Math.abs(dy * way[0]);
        if (ahead > 0 && aside <= 1.5 * ahead && ahead + 2 * aside < least) { least = ahead + 2 * aside; best = s; }
      });
      if (best) { pick(best.object, true); }
    });
    return plot;
  };

  const showTip = (event, text) => {
    const tip = $('tip');
    tip.textContent = text;
    tip.hidden = false;
    tip.style.left = Math.min(event.clientX + 14, window.innerWidth - tip.offsetWidth - 6) + 'px';
    tip.style.top = Math.min(event.clientY + 14, window.innerHeight - tip.offsetHeight - 6) + 'px';
  };
  const hideTip = () => { $('tip').hidden = true; };

  // The map.
  const charts = data.map;
  const PLANES = [];
  if (charts.near) {
    const places = new Map(charts.near_rows.map((row, i) => [row, charts.near[i]]));
    PLANES.push({
      title: 'neighbours', note: '', place: o => places.get(o.place) || null,
      under: charts.near_references, axes: [{ bare: true }, { bare: true }],
    });
  }
  if (charts.references.length > 0) {
    PLANES.push({
      title: 'principal axes', place: o => o.map, under: charts.references.map(r => r[5]),
      axes: charts.shares.map((share, i) => ({ title: `axis ${i + 1} (${Math.round(share * 100)}% of variance)` })),
    });
  }
  PLANES.forEach((plane, i) => {
    const choice = element('option', plane.title);
    choice.value = i;
    $('plane').append(choice);
  });
  $('plane').hidden = PLANES.length < 2;

  const mapPlot = makePlot('map');
  const setMap = wait => {
    const plane = PLANES[Number($('plane').value) || 0];
    mapPlot.empty = 'No object has a place on the map.';
    if (plane) {
      mapPlot.spots = [];
      objects.forEach(object => {
        const at = plane.place(object);
        if (at) { mapPlot.spots.push({ object, x: at[0], y: at[1] }); }
      });
      mapPlot.under = plane.under.map((at, i) => {
        const [name, type, gravity, kind, source] = charts.references[i];
        return { x: at[0], y: at[1], name, type, gravity, kind, source };
      });
      [mapPlot.across, mapPlot.up] = plane.axes;
    }
    mapPlot.odd = mapPlot.spots.filter(s => s.object.p_unlike !== null && s.object.p_unlike >= ODD)
      .sort((a, b) => b.object.p_unlike - a.object.p_unlike || b.object.kin_distance - a.object.kin_distance).slice(0, 12);
    const off = objects.length - mapPlot.spots.length;
    $('off').textContent = off > 0 ? `${off} without a place: too little measured` : '';
    $('off').title = $('off').textContent;
    if (wait !== true) { mapPlot.draw(); }
  };

  // The diagram.
  const QUANTITIES = [
    { title: 'Type', type: true, get: o => o.finalNumber },
    { title: 'P(substellar)', get: o => o.p_substellar },
    { title: 'S/N', get: o => o.snr },
    { title: 'Distance to kin', note: 'distance to the nearest reference object in units of scatter and noise', get: o => o.kin_distance },
    { title: 'P(unlike known)', get: o => o.p_unlike },
    { title: 'Score', get: o => o.score === undefined ? null : o.score },
    ...data.quantities.map(([title, note], i) => ({ title, note, get: o => o.values[i] })),
  ].filter(q => objects.some(o => q.get(o) !== null));
  const diagramPlot = makePlot('diagram');
  ['across', 'up'].forEach(id => QUANTITIES.forEach((q, i) => {
    const choice = element('option', q.title);
    choice.value = i;
    choice.title = q.note || '';
    $(id).append(choice);
  }));
  const preferred = title => Math.max(0, QUANTITIES.findIndex(q => q.title === title));
  $('across').value = preferred('Type');
  $('up').value = preferred(QUANTITIES.some(q => q.title === 'H-cont') ? 'H-cont' : 'P(substellar)');
  const setDiagram = wait => {
    const across = QUANTITIES[$('across').value];
    const up = QUANTITIES[$('up').value];
    diagramPlot.empty = 'Nothing to show.';
    diagramPlot.spots = [];
    if (across && up) {
      objects.forEach(object => {
        const x = across.get(object);
        const y = up.get(object);
        if (x !== null && y !== null) { diagramPlot.spots.push({ object, x, y }); }
      });
      diagramPlot.across = across;
      diagramPlot.up = up;
    }
    if (wait !== true) { diagramPlot.draw(); }
  };

  const legend = () => {
    const glyphs = $('glyphs');
    glyphs.replaceChildren();
    const present = new Set(objects.map(o => o.finalKind));
    Object.keys(GLYPHS).filter(kind => present.has(kind)).forEach(kind => {
      const item = element('span');
      const glyph = GLYPHS[kind];
      const path = [];
      const pen = {
        beginPath() {}, closePath() { path.push('Z'); },
        moveTo: (x, y) => path.push(`M${x} ${y}`), lineTo: (x, y) => path.push(`L${x} ${y}`),
        arc: (x, y, r) => path.push(`M${x - r} ${y}a${r} ${r} 0 1 0 ${2 * r} 0a${r} ${r} 0 1 0 ${-2 * r} 0`),
      };
      traceGlyph(pen, glyph, 5, 5, 3.5);
      const shade = kind === 'unlike known' ? 'var(--accent)' : kind === 'late dwarf' ? 'var(--l)' : 'var(--other)';
      const picture = drawn('svg', { viewBox: '0 0 10 10', 'aria-hidden': 'true' });
      picture.append(drawn('path', LINES.includes(glyph)
        ? { d: path.join(''), fill: 'none', stroke: shade, 'stroke-width': 1.5 } : { d: path.join(''), fill: shade }));
      item.append(picture, kind || 'kind not judged');
      glyphs.append(item);
    });
    [['under', 'reference object', 2], ['accent', 'unlike all of them', 4.5]].forEach(([shade, text, r]) => {
      const item = element('span');
      const picture = drawn('svg', { viewBox: '0 0 10 10', 'aria-hidden': 'true' });
      picture.append(drawn('circle', { cx: 5, cy: 5, r, ...(r > 2
        ? { fill: 'none', stroke: `var(--${shade})` } : { fill: `var(--${shade})` }) }));
      item.append(picture, text);
      glyphs.append(item);
    });
    const ramp = $('ramp');
    ramp.replaceChildren();
    [['M', 5], ['L', 15], ['T', 25], ['Y', 31]].forEach(([letter, type]) => {
      const item = element('span');
      const picture = drawn('svg', { viewBox: '0 0 10 10', 'aria-hidden': 'true' });
      picture.append(drawn('circle', { cx: 5, cy: 5, r: 4, fill: shadeOf(type) }));
      item.append(picture, letter);
      ramp.append(item);
    });
    const none = objects.filter(o => o.finalNumber === null).length;
    if (none > 0) { ramp.append(element('span', `${none} without type`)); }
  };

  const histogram = () => {
    const picture = $('histogram');
    const wide = Math.max(120, picture.parentNode.clientWidth);
    const tall = Math.max(60, picture.parentNode.clientHeight);
    picture.setAttribute('viewBox', `0 0 ${wide} ${tall}`);
    picture.replaceChildren();
    const focused = document.activeElement && document.activeElement.dataset ? document.activeElement.dataset.type : undefined;
    const typed = objects.filter(o => o.finalNumber !== null);
    if (typed.length === 0) {
      const note = drawn('text', { x: wide / 2, y: tall / 2, 'text-anchor': 'middle' });
      note.textContent = 'No object has a type.';
      picture.append(note);
      return;
    }
    const bin = o => Math.max(-1, Math.floor(o.finalNumber + 0.25));
    const counts = new Map();
    typed.forEach(o => {
      const count = counts.get(bin(o)) || { all: 0, shown: 0 };
      count.all++;
      if (o.at >= 0) { count.shown++; }
      counts.set(bin(o), count);
    });
    const first = Math.min(...counts.keys());
    const last = Math.max(...counts.keys()) + 1;
    const highest = Math.max(...[...counts.values()].map(c => c.all));
    const left = 24;
    const step = (wide - left) / (last - first);
    const floor = tall - 17;
    const scale = (floor - 14) / highest;
    picture.append(drawn('line', { class: 'axis', x1: left, x2: wide, y1: floor + .5, y2: floor + .5 }));
    ticksOf(0, highest, 4).ticks.filter(t => t > 0 && Number.isInteger(t)).forEach(t => {
      picture.append(drawn('line', { class: 'axis', x1: left, x2: wide, y1: floor - t * scale, y2: floor - t * scale }));
      const label = drawn('text', { x: left - 4, y: floor - t * scale + 4, 'text-anchor': 'end' });
      label.textContent = t;
      picture.append(label);
    });
    for (let type = first; type < last; type++) {
      const x = left + (type - first) * step;
      if (step > 24 || type % (step > 5 ? 5 : 10) === 0) {
        const label = drawn('text', { x: x + step / 2, y: tall - 4, 'text-anchor': 'middle' });
        label.textContent = typeCode(type);
        picture.append(label);
      }
      const count = counts.get(type);
      if (count) { picture.append(bar(type, count, x, step, floor, scale)); }
    }
    if (focused !== undefined) {
      const again = picture.querySelector(`[data-type="${focused}"]`);
      if (again) { again.focus(); }
    }
  };

  const bar = (type, count, x, step, floor, scale) => {
    const code = typeCode(type);
    const text = `${code}: ${count.shown} of ${count.all} objects`;
    const group = drawn('g', { class: 'bar', role: 'button', tabindex: 0, 'aria-label': text, 'data-type': type });
    const title = drawn('title', {});
    title.textContent = text;
    group.append(title);
    const box = (height, kind, fill) => group.append(drawn('rect', {
      class: kind, x: x + step * .08, width: Math.max(1, step * .84), y: floor - height, height, ...(fill ? { fill } : {}),
    }));
    box(count.all * scale, 'all');
    if (count.shown > 0) { box(count.shown * scale, 'some', shadeOf(type + .5)); }
    const choose = () => {
      const already = $('from').value === code && $('to').value === code;
      $('from').value = already ? '' : code;
      $('to').value = already ? '' : code;
      refresh();
    };
    group.addEventListener('click', choose);
    group.addEventListener('keydown', event => {
      if (event.key === 'Enter' || event.key === ' ') {
        event.preventDefault();
        event.stopPropagation();
        choose();
      }
    });
    return group;
  };

