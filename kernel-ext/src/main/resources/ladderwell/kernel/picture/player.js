/* Draws and plays the pictures that wait in window.ladderwellPictures. `Plotly` is the library of this very page script. */
var d = w.document;

/* ---- data: blocks of 16-bit counts, decoded once ---- */
function decode(block) {
  var text = w.atob(block.counts), n = text.length / 2, out = new Float32Array(n), step = (block.high - block.low) / 65535;
  for (var i = 0; i < n; i++) out[i] = block.low + step * (text.charCodeAt(2 * i) | text.charCodeAt(2 * i + 1) << 8);
  return out;
}
function rows(block, width) {
  var all = decode(block), out = [];
  for (var i = 0; i < all.length; i += width) out.push(all.subarray(i, i + width));
  return out;
}
function even(from, to, n) {
  var out = new Float64Array(n);
  for (var i = 0; i < n; i++) out[i] = from + (to - from) * i / (n - 1);
  return out;
}

/* ---- ink and paper: the page's own background decides between the two sets of colours ---- */
function paper(node) {
  for (var e = node; e && e.nodeType === 1; e = e.parentNode) {
    var c = (w.getComputedStyle(e).backgroundColor.match(/[\d.]+/g) || []).map(Number);
    if (c.length === 3 || c[3] > 0.5) return c;
  }
  var scheme = w.getComputedStyle(d.documentElement).colorScheme || '';
  var dark = /dark/.test(scheme) && (!/light/.test(scheme) || w.matchMedia('(prefers-color-scheme: dark)').matches);
  return dark ? [18, 18, 18] : [255, 255, 255];
}
function inks(root) {
  var p = paper(root), dark = 0.299 * p[0] + 0.587 * p[1] + 0.114 * p[2] < 128;
  root.classList.toggle('lw-dark', dark);
  var style = w.getComputedStyle(root), out = {paper: 'rgb(' + p.slice(0, 3).join(',') + ')', font: style.fontFamily};
  ['ink', 'faint', 'teal', 'fill', 'red', 'grey', 'ochre', 'indigo', 'plum', 'map1', 'map2', 'map3', 'map4', 'low1', 'low2', 'low3'].forEach(function (name) {
    out[name] = style.getPropertyValue('--lw-' + name).trim();
  });
  return out;
}
function axes(layout, ink) {
  Object.keys(layout).forEach(function (name) {
    if (!/^[xyz]axis\d*$/.test(name)) return;
    var axis = layout[name], own = name === 'yaxis2' ? ink.grey : ink.ink;
    axis.color = own;
    axis.tickcolor = axis.linecolor = ink.faint;
    axis.title = {text: axis.title.text || axis.title, font: {size: 12.5, color: own}, standoff: 6};
  });
  layout.font = {family: ink.font, size: 12.5, color: ink.ink};
  layout.paper_bgcolor = layout.plot_bgcolor = 'rgba(0,0,0,0)';
  layout.hoverlabel = {bgcolor: ink.paper, bordercolor: ink.faint, font: {family: ink.font, size: 12, color: ink.ink}};
}
function word(text, color, place) {
  return Object.assign({text: text, showarrow: false, font: {color: color, size: 11.5}}, place);
}
/* Every trace of ours is named for what it shows; the name gives it its colour. */
function paint(traces, ink) {
  traces.forEach(function (t) {
    var c = {density: ink.teal, mean: ink.teal, wave: ink.teal, potential: ink.grey, energy: ink.ochre, level: ink.ochre, spacing: ink.ochre,
      classical: ink.red, turning: ink.red}[t.name];
    if (t.name === 'signed') {
      t.colorscale = [[0, ink.low3], [0.25, ink.low2], [0.44, ink.low1], [0.5, ink.paper], [0.56, ink.map1], [0.75, ink.map2], [1, ink.map3]];
      return;
    }
    if (t.type === 'contour') { t.line.color = t.name === 'below' ? ink.red : ink.teal; return; }
    if (t.type === 'heatmap') {
      t.colorscale = [[0, ink.paper], [0.07, ink.map1], [0.33, ink.map2], [0.68, ink.map3], [1, ink.map4]];
      return;
    }
    if (t.line) t.line.color = c;
    if (t.marker) { t.marker.symbol = 'circle-open'; t.marker.color = c; if (t.marker.line) t.marker.line.color = c; }
    if (t.error_y) t.error_y.color = c;
    if (t.fill) t.fillcolor = ink.fill;
  });
}
/* Calls back when the width of the picture or the colours of the page change. */
function watch(root, resized, recoloured) {
  var last = root.clientWidth, was = paper(root).join();
  if (w.ResizeObserver) new w.ResizeObserver(function () {
    if (root.clientWidth && root.clientWidth !== last) { last = root.clientWidth; resized(); }
  }).observe(root);
  function check() { var now = paper(root).join(); if (now !== was && root.isConnected) { was = now; recoloured(); } }
  w.matchMedia('(prefers-color-scheme: dark)').addEventListener('change', check);
  var look = new w.MutationObserver(function () { w.setTimeout(check, 60); });
  [d.documentElement, d.body].forEach(function (e) { look.observe(e, {attributes: true}); });
}
function width(root) { return Math.max(300, Math.min(780, root.clientWidth || 780)); }
function element(parent, tag, name) {
  var e = d.createElement(tag);
  e.className = name;
  parent.appendChild(e);
  return e;
}
/* The place of the drawing: before the still picture, which goes when the drawing is there. */
function stage(root) {
  var still = root.querySelector('.lw-still'), box = d.createElement('div');
  box.className = 'lw-stage';
  box.setAttribute('role', 'img');
  box.setAttribute('aria-label', still.getAttribute('alt') || still.textContent);
  still.parentNode.insertBefore(box, still);
  box.drawn = function () { if (still.parentNode) still.parentNode.removeChild(still); root.classList.add('lw-drawn'); };
  return box;
}
var quiet = {displayModeBar: false, responsive: false};

/* ---- the density animation ---- */
function motion(root, p) {
  var m = p.data, n = m.x[2], frames = rows(m.frames, n), last = frames.length - 1, x = even(m.x[0], m.x[1], n);
  var ring = decode(m.ring), ringHeight = decode(m.ringHeight), mean = decode(m.mean);
  var time = even(m.time[0], m.time[1], last + 1), clock = even(0, m.clock.end, last + 1);
  var box = stage(root), now = element(box, 'div', 'lw-now'), strip = element(box, 'div', 'lw-strip');
  var cursor = p.strip && element(strip, 'div', 'lw-cursor'), field = p.wigner && wigner(p, last);
  var bar = element(box.parentNode, 'div', 'lw-controls'), button = element(bar, 'button', 'lw-play');
  box.parentNode.insertBefore(bar, box.nextSibling);
  bar.setAttribute('data-lm-suppress-shortcuts', 'true');
  button.type = 'button';
  button.innerHTML = '<svg width="10" height="12" aria-hidden="true"><path class="lw-go" d="M1 0v12l9-6z"/><path class="lw-stop" d="M1 0h3v12H1zM6 0h3v12H6z"/></svg>';
  var slider = element(bar, 'input', 'lw-slider'), said = element(bar, 'span', 'lw-time');
  slider.type = 'range';
  slider.min = 0;
  slider.max = last;
  slider.value = 0;
  slider.setAttribute('aria-label', 'time');

  var ink = inks(root), top = p.now, below = p.strip || p.phase, k = 0, playing = false, drawing = false;
  top.traces[0].x = x;
  top.traces[0].y = frames[0];
  top.traces[1].x = m.potential.x;
  top.traces[1].y = m.potential.v;
  var rail = m.rail;
  if (!field) Object.assign(below.traces[0], {x: x, y: time, z: frames, zmin: 0, zmax: m.frames.high, zsmooth: 'best', showscale: false});
  if (below.traces[1] && !field) {
    below.traces[1].x = decode(m.orbit);
    below.traces[1].y = even(m.time[0], m.time[1], below.traces[1].x.length);
  }
  top.traces.forEach(function (t) { t.hoverinfo = 'skip'; });
  top.traces[0].hoverinfo = undefined;
  top.traces[0].hovertemplate = m.words.hover;
  below.traces[0].hovertemplate = field ? p.wigner.words.hover : m.words.stripHover;
  below.traces.slice(1).forEach(function (t) { t.hoverinfo = 'skip'; });

  function moving(i) {
    return [{y: frames[i]}, {x: [mean[i], mean[i]]}, {x: [ring[i]], y: [ringHeight[i]]}];
  }
  function dress() {
    ink = inks(root);
    axes(top.layout, ink);
    axes(below.layout, ink);
    paint(top.traces, ink);
    paint(below.traces, ink);
    var e = {xref: 'paper', x: 1, yref: 'y2', xanchor: 'left', xshift: 5};
    top.layout.annotations = [
      word(m.words.energy, ink.ochre, Object.assign({y: m.energy}, e)),
      word(m.words.potential, ink.grey, {xref: 'paper', x: 1, xanchor: 'left', yref: 'paper', y: 1, yanchor: 'top', xshift: 5, align: 'left'}),
      word('\u27e8x\u27e9', ink.teal, {xref: 'paper', x: 0, xanchor: 'right', xshift: -6, yref: 'y', y: -rail * 0.66})
    ];
    below.layout.annotations = field ? field.words(ink) : [word(below.traces[1] ? '\u25cb\u2009\u2014<br>classical' : '\u25cb<br>classical', ink.red,
      {xref: 'paper', x: 1, xanchor: 'left', xshift: 12, yref: 'paper', y: 1, yanchor: 'top', align: 'left'})];
    top.layout.width = below.layout.width = width(root);
  }
  function place() {
    if (field) return;
    var size = strip._fullLayout._size;
    cursor.style.top = (size.t + size.h * k / last) + 'px';
    cursor.style.left = size.l + 'px';
    cursor.style.width = size.w + 'px';
  }
  function text(i) {
    var lab = clock[i].toFixed(m.clock.digits) + m.clock.unit;
    return m.periods ? (m.periods * i / last).toFixed(m.periodDigits) + ' periods = ' + lab : lab;
  }
  function show(i) {
    k = i;
    slider.value = i;
    slider.style.setProperty('--lw-part', 100 * i / last + '%');
    said.textContent = text(i);
    slider.setAttribute('aria-valuetext', said.textContent);
    place();
    if (field) field.show(strip, below, i, ring[i]);
    var all = moving(i);
    return Plotly.animate(now, {data: all, traces: [0, 4, 5]},
      {mode: 'immediate', transition: {duration: 0}, frame: {duration: 0, redraw: false}}).catch(function () {});
  }
  var from = 0, began = 0;
  function step(at) {
    if (!playing) return;
    if (!root.isConnected) { play(false); return; }
    if (!began) began = at;
    var next = (from + Math.floor((at - began) / m.pace)) % (last + 1);
    if (next !== k) show(next);
    w.requestAnimationFrame(step);
  }
  function play(on) {
    playing = on;
    root.classList.toggle('lw-playing', on);
    button.setAttribute('aria-label', on ? 'pause' : 'play');
    from = k;
    began = 0;
    if (on) w.requestAnimationFrame(step);
  }
  function go(i) {
    i = Math.max(0, Math.min(last, i));
    if (i !== k) show(i);
    from = i;
    began = 0;
  }
  button.addEventListener('click', function () { play(!playing); });
  slider.addEventListener('input', function () { go(+slider.value); });
  bar.addEventListener('keydown', function (e) {
    var by = {ArrowLeft: -1, ArrowDown: -1, ArrowRight: 1, ArrowUp: 1, PageDown: -10, PageUp: 10}[e.key];
    if (by) go(k + by);
    else if (e.key === 'Home') go(0);
    else if (e.key === 'End') go(last);
    else if (e.key === ' ') play(!playing);
    else return;
    e.preventDefault();
    e.stopPropagation();
  });
  bar.addEventListener('keyup', function (e) { if (e.key === ' ') e.preventDefault(); });
  /* Clicks and drags on the strip belong to us, not to the plot's own zoom. */
  if (field) strip.classList.remove('lw-strip');
  function at(e) {
    var size = strip._fullLayout._size, y = e.clientY - strip.getBoundingClientRect().top - size.t;
    go(Math.round(last * y / size.h));
  }
  strip.addEventListener('pointerdown', function (e) {
    if (e.button !== 0 || field) return;
    drawing = e.pointerType !== 'touch';
    if (drawing) strip.setPointerCapture(e.pointerId);
    at(e);
    e.stopPropagation();
  }, true);
  strip.addEventListener('pointermove', function (e) { if (drawing) { at(e); e.stopPropagation(); } }, true);
  ['pointerup', 'pointercancel'].forEach(function (end) { strip.addEventListener(end, function () { drawing = false; }, true); });
  ['mousedown', 'touchstart'].forEach(function (start) {
    strip.addEventListener(start, function (e) { e.stopPropagation(); }, {capture: true, passive: true});
  });

  dress();
  play(false);
  return Promise.all([Plotly.newPlot(now, top.traces, top.layout, quiet), Plotly.newPlot(strip, below.traces, below.layout, quiet)])
    .then(function () {
      box.drawn();
      root.ladderwell = {show: go, play: play, now: function () { return k; }};
      return show(Math.min(last, m.start));
    }).then(function () {
      function again() {
        dress();
        var all = moving(k);
        [0, 4, 5].forEach(function (t, j) { Object.assign(top.traces[t], all[j]); });
        if (field) field.put(below, k, ring[k]);
        Plotly.react(now, top.traces, top.layout, quiet);
        Plotly.react(strip, below.traces, below.layout, quiet).then(place);
      }
      watch(root, again, again);
    });
}

/* The Wigner function below the density: its frames, the ring on the orbit, and its words. */
function wigner(p) {
  var g = p.wigner, n = g.x[2] * g.y[2], momentum = decode(g.momentum), raw = w.atob(g.frames), kept = {};
  Object.assign(p.phase.traces[0], {x: even(g.x[0], g.x[1], g.x[2]), y: even(g.y[0], g.y[1], g.y[2]), zmin: -g.peak, zmax: g.peak, zsmooth: 'best', showscale: false});
  Object.assign(p.phase.traces[1], {x: p.phase.traces[0].x, y: p.phase.traces[0].y});
  p.phase.traces[0].z = p.phase.traces[1].z = frame(0);
  function frame(i) { return kept[i] || (kept[i] = signed(raw.slice(i * n, i * n + n), g.peak, g.x[2])); }
  return {
    put: function (below, i, x) {
      below.traces[0].z = below.traces[1].z = frame(i);
      Object.assign(below.traces[3], {x: [x], y: [momentum[i]]});
    },
    show: function (node, below, i, x) {
      if (!node.data) return;
      this.put(below, i, x);
      Plotly.react(node, below.traces, below.layout, quiet);
    },
    words: function (ink) {
      var place = {xref: 'paper', x: 1, xanchor: 'left', xshift: 8, yref: 'paper', y: 1, yanchor: 'top', align: 'left'};
      var all = [word(g.words.above, ink.teal, place)];
      if (g.words.below) all.push(word(g.words.below, ink.red, Object.assign({yshift: -36}, place)));
      all.push(word('\u25cb\u2009\u2014<br>classical', ink.red, Object.assign({yshift: -96}, place)));
      return all;
    }
  };
}

/* ---- a Wigner or Husimi function at one instant, with its marginals ---- */
function signed(raw, peak, across) {
  var out = [];
  for (var at = 0; at < raw.length; at += across) {
    var row = new Float32Array(across);
    for (var i = 0; i < across; i++) row[i] = peak * (raw.charCodeAt(at + i) - 128) / 127;
    out.push(row);
  }
  return out;
}
function phase(root, p) {
  var m = p.data, box = element(stageOf(root), 'div', 'lw-phase');
  var x = even(m.x[0], m.x[1], m.x[2]), y = even(m.y[0], m.y[1], m.y[2]), field = signed(w.atob(m.field), m.peak, m.x[2]);
  p.traces.slice(0, 3).forEach(function (t) { t.x = x; t.y = y; t.z = field; t.hoverinfo = 'skip'; });
  var map = p.traces[0];
  map.hoverinfo = undefined;
  map.hovertemplate = m.words.hover;
  map.zmin = map.name === 'signed' ? -m.peak : 0;
  map.zmax = m.peak;
  map.zsmooth = 'best';
  map.showscale = false;
  p.traces[5].x = x;
  p.traces[5].y = decode(m.overMomenta);
  p.traces[6].x = decode(m.overPositions);
  p.traces[6].y = y;
  p.traces.slice(3).forEach(function (t) { t.hoverinfo = 'skip'; });
  function dress() {
    var ink = inks(root), l = p.layout, b = l.margin, side = Math.min(m.side, width(root) - b.l - m.gap - m.marginal - 8);
    var all = side + m.gap + m.marginal, part = side / all, next = (side + m.gap) / all;
    axes(l, ink);
    paint(p.traces, ink);
    b.r = 8;
    l.width = b.l + all + b.r;
    l.height = b.t + all + b.b;
    l.xaxis.domain = l.yaxis.domain = [0, part];
    l.xaxis2.domain = l.yaxis3.domain = [next, 1];
    var place = {xref: 'paper', x: next, xanchor: 'left', yref: 'paper', yanchor: 'top', align: 'left'};
    l.annotations = [word(m.words.above, ink.teal, Object.assign({y: 1}, place)),
      word(m.words.classical, ink.red, Object.assign({y: next, yshift: 18}, place))];
    if (m.words.below) l.annotations.push(word(m.words.below, ink.red, Object.assign({y: 1, yshift: -17}, place)));
  }
  dress();
  return Plotly.newPlot(box, p.traces, p.layout, quiet).then(function () {
    box.parentNode.drawn();
    function again() { dress(); Plotly.react(box, p.traces, p.layout, quiet); }
    watch(root, again, again);
  });
}

/* ---- potential, levels and wave functions ---- */
function levels(root, p) {
  var m = p.data, box = element(stageOf(root), 'div', 'lw-levels');
  var n = m.x[2], waves = m.waves ? rows(m.waves, n) : [], x = even(m.x[0], m.x[1], n);
  p.traces[0].x = m.potential.x;
  p.traces[0].y = m.potential.v;
  waves.forEach(function (y, i) { p.traces[2 + i].x = x; p.traces[2 + i].y = y; });
  p.traces.forEach(function (t, i) {
    if (i < 2) { t.hoverinfo = 'skip'; return; }
    t.hoverinfo = 'text';
    t.text = t.name === 'spacing' ? m.words.spacings : m.words.hover[i - 2];
  });
  var beside = p.layout.xaxis2, end = beside ? p.layout.xaxis.domain[1] : 1, margin = p.layout.margin.r;
  function dress() {
    var ink = inks(root), wide = width(root);
    axes(p.layout, ink);
    paint(p.traces, ink);
    p.layout.width = wide;
    /* On a narrow page the levels take the whole width. */
    if (beside) {
      var room = wide >= 560;
      p.layout.xaxis.domain = [0, room ? end : 1];
      p.layout.margin.r = room ? margin : 66;
      beside.visible = p.layout.yaxis3.visible = room;
      p.traces[p.traces.length - 1].visible = room;
    }
    p.layout.annotations = m.labels.map(function (l) {
      return word(l.text, ink.ochre, {xref: 'paper', x: p.layout.xaxis.domain ? p.layout.xaxis.domain[1] : 1, xanchor: 'left', xshift: 5, yref: 'y', y: l.y});
    });
  }
  dress();
  return Plotly.newPlot(box, p.traces, p.layout, quiet).then(function () {
    box.parentNode.drawn();
    function again() { dress(); Plotly.react(box, p.traces, p.layout, quiet); }
    watch(root, again, again);
  });
}
function stageOf(root) { return root.querySelector('.lw-stage') || stage(root); }

/* ---- any figure that a Java cell returned ---- */
function figure(root, p) {
  var box = element(stageOf(root), 'div', 'lw-plain'), asked = p.layout.width;
  function dress() {
    var ink = inks(root);
    axes(p.layout, ink);
    p.layout.colorway = [ink.teal, ink.ochre, ink.indigo, ink.plum, ink.red, ink.grey];
    ['xaxis', 'yaxis'].forEach(function (name) {
      var axis = p.layout[name] = p.layout[name] || {};
      axis.gridcolor = axis.zerolinecolor = 'rgba(128,128,128,.22)';
    });
    p.layout.width = asked ? Math.min(asked, Math.max(300, root.clientWidth || asked)) : width(root);
  }
  dress();
  return Plotly.newPlot(box, p.traces, p.layout, quiet).then(function () {
    box.parentNode.drawn();
    function again() { dress(); Plotly.react(box, p.traces, p.layout, quiet); }
    watch(root, again, again);
  });
}

/* ---- the queue: a picture may come before its place in the page is there ---- */
var kinds = {motion: motion, levels: levels, phase: phase, figure: figure};
function draw(p, tries) {
  var found = false;
  Array.prototype.forEach.call(d.querySelectorAll('[data-ladderwell="' + p.key + '"]'), function (root) {
    found = true;
    if (root.ladderwellTaken) return;
    root.ladderwellTaken = true;
    var hint = root.querySelector('.lw-hint');
    if (hint) hint.hidden = true;
    function failed(error) {
      if (hint) { hint.hidden = false; hint.textContent = 'This picture could not be drawn: ' + error.message; }
      if (w.console) w.console.error(error);
    }
    try { kinds[p.kind](root, JSON.parse(JSON.stringify(p))).catch(failed); } catch (error) { failed(error); }
  });
  if (!found && tries < 1200) w.setTimeout(function () { draw(p, tries + 1); }, tries < 40 ? 50 : 500);
}
var waiting = w.ladderwellPictures || [];
w.ladderwellPictures = {push: function (p) { draw(p, 0); }};
w.ladderwellPlayer = true;
waiting.forEach(function (p) { draw(p, 0); });
