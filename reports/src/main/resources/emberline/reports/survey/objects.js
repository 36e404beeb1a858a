'use strict';
(() => {
  // What the run found: one object a row, and what holds where the observer overrides it.
  const CLASSES = 'MLTY';
  const NO_DWARF = ['giant', 'early star', 'carbon star', 'reddened background', 'extragalactic', 'unlike known'];
  const SET_ASIDE = [...NO_DWARF, 'bad data'];
  const DECISIONS = ['substellar', 'stellar', 'undecided'];
  const ODD = 0.5;
  const $ = id => document.getElementById(id);
  const data = JSON.parse($('data').textContent);
  const KEYS = data.keys;
  const objects = data.rows.map((cells, place) => {
    const object = { place };
    for (let i = 0; i < KEYS.length; i++) { object[KEYS[i]] = cells[i]; }
    return object;
  });
  data.rows = null;
  const cautionsOf = object => object.cautions.map(number => data.texts[number]);

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
  const fixed = (number, digits) => number === null || number === undefined ? '' : number.toFixed(digits);
  const clean = number => number > 0.99 ? '>0.99' : number < 0.01 ? '<0.01' : number.toFixed(2);

  const typeOf = code => {
    const match = /^\s*(?:[eu]?s?d\/?)*([KMLTY])\s*(\d(?:\.\d+)?)/.exec(code);
    if (!match) { return null; }
    const sub = Number(match[2]);
    if (match[1] === 'K') { return sub <= 7 ? -1 + (sub - 7) / 2 : -1 + (sub - 7) / 3; }
    return CLASSES.indexOf(match[1]) * 10 + sub;
  };
  const typeCode = number => number < 0 ? 'K' : CLASSES[Math.min(3, Math.floor(number / 10))] + Math.round((number % 10) * 10) / 10;

  // The same rules as in the results table.
  const hold = object => {
    const said = object.said || {};
    const call = said.verdict || '';
    const aside = SET_ASIDE.includes(call);
    object.byObserver = Boolean(call || said.type || said.gravity);
    object.finalType = said.type || (aside ? '' : object.type);
    object.finalNumber = said.type ? typeOf(said.type) : aside ? null : object.type_number;
    object.finalGravity = said.gravity || (aside ? '' : object.gravity);
    object.finalKind = NO_DWARF.includes(call) || call === 'late dwarf' ? call
      : call === 'substellar' ? 'late dwarf' : call === 'bad data' ? '' : object.kind;
    object.finalDecision = DECISIONS.includes(call) ? call : aside ? '' : object.decision;
    object.differs = object.finalType !== object.type || object.finalGravity !== object.gravity
      || object.finalKind !== object.kind || object.finalDecision !== object.decision;
    object.sorted = said.verdict || said.type || said.gravity || (said.note ? '~' : '');
    object.words = null;
  };

  const words = object => {
    if (object.words === null) {
      const said = object.said || {};
      object.words = [object.name, object.status, object.reason, object.finalType, object.finalGravity,
        object.finalKind, object.finalDecision, object.type, object.kind, object.sentence, object.findings,
        cautionsOf(object).join(' '), object.listed, object.kin, object.next_step, said.verdict, said.type,
        said.gravity, said.note].join(' ').toLowerCase();
    }
    return object.words;
  };

