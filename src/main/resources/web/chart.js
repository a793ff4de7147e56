"use strict";
/*
 * The course of a point's water: Ω, pH, temperature and salinity one above the other on one time axis, limits drawn in, gaps left
 * as gaps. The same is said in words beneath, and the cursor's place in words above; arrow keys, mouse and finger move it.
 */
(() => {
  const place = document.getElementById("history");
  if (!place || typeof uPlot === "undefined") return;

  const HOUR = 3600;
  const RANGES = [
    { label: "6 h", hours: 6, step: "PT2M" },
    { label: "48 h", hours: 48, step: "PT10M" },
    { label: "14 days", hours: 336, step: "PT1H" },
  ];
  const PANELS = [
    { key: "omegaAragonite", name: "Ω aragonite", digits: 2, height: 190, least: 0.6, wide: true },
    { key: "phTotal", name: "pH (total scale)", digits: 2, height: 120, least: 0.2 },
    { key: "temperatureC", name: "Temperature, °C", digits: 1, height: 120, least: 2 },
    { key: "salinity", name: "Salinity", digits: 1, height: 120, least: 2 },
  ];
  const zone = place.dataset.zone;
  const dark = matchMedia("(prefers-color-scheme: dark)");
  const clock = new Intl.DateTimeFormat("en-GB", { timeZone: zone, weekday: "short", day: "numeric", month: "short", hour: "2-digit", minute: "2-digit" });
  const limits = () => [...document.querySelectorAll("[data-quantity]")].map(e => ({
    key: e.dataset.quantity,
    below: e.dataset.below === "" ? null : Number(e.dataset.below),
    above: e.dataset.above === "" ? null : Number(e.dataset.above),
  }));

  let range = RANGES[1];
  let states = [];
  let doses = [];
  let plots = [];
  let at = -1;
  let loaded = 0;

  const make = (tag, attributes, ...inside) => {
    const element = document.createElement(tag);
    for (const [name, value] of Object.entries(attributes)) element.setAttribute(name, value);
    element.append(...inside);
    return element;
  };
  const buttons = make("div", { class: "ranges", role: "group", "aria-label": "How far back" });
  for (const r of RANGES) {
    const button = make("button", { type: "button", "aria-pressed": String(r === range) }, r.label);
    button.addEventListener("click", () => {
      range = r;
      for (const b of buttons.children) b.setAttribute("aria-pressed", String(b === button));
      load();
    });
    buttons.append(button);
  }
  const words = make("p", { class: "said-at", "aria-live": "polite" });
  const charts = make("div", { class: "charts", tabindex: "0", role: "group", "aria-label": `Course of the water at ${place.dataset.name}. Left and right arrows move through time.` });
  place.append(buttons, words, charts);
  const summary = document.getElementById("history-words") ?? place.parentNode.appendChild(make("p", { id: "history-words" }));
  const summaryHow = document.getElementById("history-how");

  const colour = name => getComputedStyle(document.documentElement).getPropertyValue(`--${name}`).trim();
  const fixed = (value, digits) => value == null ? null : value.toFixed(digits);
  const uncertainty = s => s.standardUncertainty?.omegaAragonite?.total ?? null;

  async function load() {
    const wanted = range;
    const to = new Date();
    const query = new URLSearchParams({ from: new Date(to - wanted.hours * HOUR * 1000).toISOString(), to: to.toISOString(), step: wanted.step });
    if (place.dataset.site) query.set("site", place.dataset.site);
    try {
      const answer = await fetch(`${place.dataset.water}?${query}`, { headers: { Accept: "application/json" }, credentials: "same-origin" });
      if (!answer.ok) throw new Error(`answer ${answer.status}`);
      const found = (await answer.json()).states.filter(s => s.at).sort((a, b) => Date.parse(a.at) - Date.parse(b.at));
      const given = await loadDoses(query);
      if (wanted !== range) return;
      doses = given;
      states = withGaps(found);
      loaded = Date.now();
      at = -1;
      draw();
      summarise(found);
    } catch (problem) {
      console.warn("no history", problem);
      words.textContent = "The course could not be loaded. Choose a span to try again.";
    }
  }

  /* the course is worth showing without them */
  async function loadDoses(query) {
    if (!place.dataset.doses) return [];
    const span = new URLSearchParams(query);
    span.delete("step");
    try {
      const answer = await fetch(`${place.dataset.doses}?${span}`, { headers: { Accept: "application/json" }, credentials: "same-origin" });
      if (!answer.ok) throw new Error(`answer ${answer.status}`);
      return (await answer.json()).doses.filter(d => d.state === "recorded" && d.massG > 0).reverse();
    } catch (problem) {
      console.warn("no doses", problem);
      return [];
    }
  }

  /* where nothing came for much longer than usual, the line must break */
  function withGaps(found) {
    const time = found.map(s => Date.parse(s.at) / 1000);
    const pauses = time.slice(1).map((t, i) => t - time[i]).sort((a, b) => a - b);
    const usual = pauses[Math.floor(pauses.length / 2)] ?? 0;
    const whole = [];
    found.forEach((s, i) => {
      if (i > 0 && time[i] - time[i - 1] > 3 * usual) whole.push({ at: new Date((time[i - 1] + usual) * 1000).toISOString() });
      whole.push(s);
    });
    return whole;
  }

  function summarise(found) {
    const known = found.filter(s => s.omegaAragonite != null);
    const put = doses.length === 0 ? "" : ` Doses, marked on the chart: ${doses.map(d => `${d.massG} g on ${clock.format(new Date(d.at))}`).join("; ")}.`;
    if (known.length === 0) {
      summary.textContent = `No Ω is known for the last ${range.label}.${put}`;
      if (summaryHow) summaryHow.hidden = true;
      return;
    }
    const lowest = known.reduce((a, b) => b.omegaAragonite < a.omegaAragonite ? b : a);
    const highest = known.reduce((a, b) => b.omegaAragonite > a.omegaAragonite ? b : a);
    const gaps = states.length - found.length;
    if (summaryHow) {
      summaryHow.hidden = false;
      summaryHow.href = how(lowest.at).href;
    }
    summary.textContent = `In the last ${range.label}: lowest Ω ${fixed(lowest.omegaAragonite, 2)} on ${clock.format(new Date(lowest.at))}, `
      + `highest Ω ${fixed(highest.omegaAragonite, 2)} on ${clock.format(new Date(highest.at))}`
      + (gaps === 0 ? ", no gaps." : gaps === 1 ? ", one gap without measurements." : `, ${gaps} gaps without measurements.`) + put;
  }

  /* the state of that moment, with where each of its inputs came from */
  const how = iso => make("a", { href: place.dataset.how.replace("MOMENT", encodeURIComponent(iso)) }, "How was this computed?");

  function say(index) {
    const s = states[index];
    if (!s) {
      words.textContent = "Point at the chart, or use the arrow keys, to read a moment.";
      return;
    }
    const u = uncertainty(s);
    const parts = [
      s.omegaAragonite == null ? "Ω not known" : `Ω ${fixed(s.omegaAragonite, 2)}${u == null ? "" : ` ±${fixed(u, 2)}`}`,
      s.phTotal == null ? null : `pH ${fixed(s.phTotal, 2)}`,
      s.temperatureC == null ? null : `${fixed(s.temperatureC, 1)} °C`,
      s.salinity == null ? null : `salinity ${fixed(s.salinity, 1)}`,
    ];
    words.textContent = `${clock.format(new Date(s.at))}: ${parts.filter(Boolean).join(", ")}. `;
    words.append(how(s.at));
  }

  function hatch(context) {
    const tile = document.createElement("canvas");
    const size = Math.round(8 * devicePixelRatio);
    tile.width = tile.height = size;
    const c = tile.getContext("2d");
    c.strokeStyle = colour("bill");
    c.globalAlpha = 0.55;
    c.lineWidth = 1.3 * devicePixelRatio;
    c.beginPath();
    for (const shift of [-size, 0, size]) {
      c.moveTo(shift, size);
      c.lineTo(shift + size, 0);
    }
    c.stroke();
    return context.createPattern(tile, "repeat");
  }

  function drawLimits(panel) {
    return u => {
      const { ctx, bbox } = u;
      ctx.save();
      ctx.beginPath();
      ctx.rect(bbox.left, bbox.top, bbox.width, bbox.height);
      ctx.clip();
      for (const limit of limits().filter(l => l.key === panel.key)) {
        for (const [value, side] of [[limit.below, "below"], [limit.above, "above"]]) {
          if (value == null || Number.isNaN(value)) continue;
          const y = u.valToPos(value, "y", true);
          ctx.fillStyle = hatch(ctx);
          if (side === "below") ctx.fillRect(bbox.left, y, bbox.width, bbox.top + bbox.height - y);
          else ctx.fillRect(bbox.left, bbox.top, bbox.width, y - bbox.top);
          ctx.strokeStyle = colour("bill");
          ctx.lineWidth = 2 * devicePixelRatio;
          ctx.beginPath();
          ctx.moveTo(bbox.left, y);
          ctx.lineTo(bbox.left + bbox.width, y);
          ctx.stroke();
          ctx.font = `bold ${13 * devicePixelRatio}px system-ui, sans-serif`;
          ctx.textAlign = "left";
          const room = side === "below" ? bbox.top + bbox.height - y : y - bbox.top;
          const under = (side === "below") === (room > 22 * devicePixelRatio);
          ctx.textBaseline = under ? "top" : "bottom";
          const text = `${side} ${value.toFixed(panel.digits)}: alert`;
          const top = y + (under ? 5 : -5) * devicePixelRatio;
          ctx.lineWidth = 5 * devicePixelRatio;
          ctx.lineJoin = "round";
          ctx.strokeStyle = colour("nacre");
          ctx.strokeText(text, bbox.left + 6 * devicePixelRatio, top);
          ctx.fillStyle = colour("bill");
          ctx.fillText(text, bbox.left + 6 * devicePixelRatio, top);
        }
      }
      ctx.restore();
    };
  }

  /* a dotted line through every panel, and the grams beside it in the first */
  function drawDoses(first) {
    return u => {
      const { ctx, bbox } = u;
      const px = devicePixelRatio;
      ctx.save();
      ctx.beginPath();
      ctx.rect(bbox.left, bbox.top, bbox.width, bbox.height);
      ctx.clip();
      ctx.strokeStyle = ctx.fillStyle = colour("ink");
      ctx.lineWidth = 2 * px;
      ctx.setLineDash([2 * px, 4 * px]);
      ctx.font = `bold ${13 * px}px system-ui, sans-serif`;
      ctx.textBaseline = "top";
      for (const dose of doses) {
        const x = u.valToPos(Date.parse(dose.at) / 1000, "x", true);
        ctx.beginPath();
        ctx.moveTo(x, bbox.top);
        ctx.lineTo(x, bbox.top + bbox.height);
        ctx.stroke();
        if (!first) continue;
        const right = x > bbox.left + bbox.width * 0.8;
        ctx.textAlign = right ? "right" : "left";
        ctx.fillText(`${dose.massG} g`, x + (right ? -5 : 5) * px, bbox.top + 3 * px);
      }
      ctx.restore();
    };
  }

  function scaleOf(panel) {
    const edges = limits().filter(l => l.key === panel.key).flatMap(l => [l.below, l.above]).filter(v => v != null && !Number.isNaN(v));
    return (u, low, high) => {
      if (low == null || high == null) return [0, 1];
      low = Math.min(low, ...edges);
      high = Math.max(high, ...edges);
      const pad = Math.max((high - low) * 0.12, (panel.least - (high - low)) / 2);
      return [low - pad, high + pad];
    };
  }

  function draw() {
    for (const plot of plots) plot.destroy();
    charts.replaceChildren();
    plots = [];
    const time = states.map(s => Date.parse(s.at) / 1000);
    const now = Date.now() / 1000;
    const ink = colour("ink");
    const axis = { stroke: colour("slate"), font: "13px system-ui, sans-serif", grid: { stroke: colour("sand"), width: 1 }, ticks: { stroke: colour("rim"), width: 1, size: 5 } };
    PANELS.forEach((panel, index) => {
      const end = index === PANELS.length - 1;
      const values = states.map(s => s[panel.key] ?? null);
      const series = [{}, { stroke: ink, width: 2, points: { show: false }, spanGaps: false }];
      const data = [time, values];
      let bands = [];
      if (panel.wide) {
        const low = states.map(s => s[panel.key] == null || uncertainty(s) == null ? null : s[panel.key] - uncertainty(s));
        const high = states.map(s => s[panel.key] == null || uncertainty(s) == null ? null : s[panel.key] + uncertainty(s));
        const edge = { stroke: colour("rim"), width: 0.5, points: { show: false }, spanGaps: false };
        series.push({ ...edge }, { ...edge });
        data.push(high, low);
        bands = [{ series: [2, 3], fill: colour("slate") + "38" }];
      }
      charts.append(make("h3", {}, panel.wide ? `${panel.name}, with its standard uncertainty` : panel.name));
      plots.push(new uPlot({
        width: place.clientWidth,
        height: panel.height + (end ? 42 : 0),
        padding: [8, 10, 4, 0],
        legend: { show: false },
        tzDate: t => uPlot.tzDate(new Date(t * 1000), zone),
        cursor: { sync: { key: "course" }, y: false, drag: { x: false, y: false }, points: { show: false } },
        scales: { x: { time: true, range: () => [now - range.hours * HOUR, now] }, y: { range: scaleOf(panel) } },
        axes: [
          { ...axis, size: end ? 46 : 0, values: end ? ticks : () => [], space: 70 },
          { ...axis, size: 48, space: 34, values: (u, splits) => splits.map(v => v.toFixed(panel.digits === 2 ? (splits[1] - splits[0] < 0.1 ? 2 : 1) : splits[1] - splits[0] < 1 ? 1 : 0)) },
        ],
        series,
        bands,
        hooks: {
          drawAxes: [drawLimits(panel), drawDoses(index === 0)],
          setCursor: [u => { if (u.cursor.idx != null && u.cursor.idx !== at) { at = u.cursor.idx; say(at); } }],
        },
      }, data, charts));
    });
    say(-1);
  }

  const hour = new Intl.DateTimeFormat("en-GB", { timeZone: zone, hour: "2-digit", minute: "2-digit" });
  const day = new Intl.DateTimeFormat("en-GB", { timeZone: zone, day: "numeric", month: "short" });
  function ticks(u, splits) {
    let before = "";
    return splits.map(t => {
      const date = new Date(t * 1000);
      const today = day.format(date);
      const shown = range.hours > 100 ? today : hour.format(date) + (today === before ? "" : `\n${today}`);
      before = today;
      return shown;
    });
  }

  function moveTo(index) {
    if (states.length === 0 || plots.length === 0) return;
    const next = Math.min(states.length - 1, Math.max(0, index));
    const left = plots[0].valToPos(Date.parse(states[next].at) / 1000, "x");
    for (const plot of plots) plot.setCursor({ left, top: 10 }, false);
    at = next;
    say(next);
  }

  charts.addEventListener("keydown", event => {
    const far = event.shiftKey ? 12 : 1;
    const from = at < 0 ? states.length : at;
    const goals = { ArrowLeft: from - far, ArrowRight: from + far, Home: 0, End: states.length - 1 };
    if (event.key in goals) {
      event.preventDefault();
      moveTo(goals[event.key]);
    }
  });
  const finger = event => {
    if (event.pointerType !== "touch" || plots.length === 0) return;
    const left = event.clientX - plots[0].over.getBoundingClientRect().left;
    moveTo(plots[0].posToIdx(Math.min(plots[0].over.clientWidth, Math.max(0, left))));
  };
  charts.addEventListener("pointerdown", finger);
  charts.addEventListener("pointermove", finger);

  let width = 0;
  new ResizeObserver(() => {
    if (place.clientWidth === width) return;
    width = place.clientWidth;
    plots.forEach((plot, i) => plot.setSize({ width, height: PANELS[i].height + (i === PANELS.length - 1 ? 42 : 0) }));
  }).observe(place);
  dark.addEventListener("change", draw);
  document.addEventListener("hingeline:changed", () => { if (Date.now() - loaded > 60000 && at < 0) load(); });
  load();
})();
