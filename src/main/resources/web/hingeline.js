"use strict";
/*
 * Keeps a page true while it is open: ages tick on, and where the page has a part marked data-live, that part is fetched again
 * when the server says that something changed. Without this script the page still says everything, as of when it was loaded.
 *
 * The server sends on the address in <body data-events="…"> the event "changed" when anything shown has changed and, if it
 * wants silent breaks of the line to be noticed, the event "alive" at least every 30 s.
 */
(() => {
  const SECOND = 1000;
  const MINUTE = 60 * SECOND;
  const SILENCE = 75 * SECOND;
  const PATIENCE = 5 * SECOND;

  function age(iso) {
    const seconds = (Date.now() - skew - Date.parse(iso)) / SECOND;
    if (seconds < 60) return "just now";
    const minutes = Math.floor(seconds / 60);
    if (minutes < 60) return `${minutes} min ago`;
    const hours = Math.floor(minutes / 60);
    if (hours < 24) return minutes % 60 === 0 ? `${hours} h ago` : `${hours} h ${minutes % 60} min ago`;
    return hours < 72 ? `${hours} h ago` : `${Math.floor(hours / 24)} days ago`;
  }

  /* a phone's clock may be wrong; ages are counted on the server's, known to the second from its Date header */
  let skew = 0;

  function tick() {
    for (const element of document.querySelectorAll("[data-age]")) {
      const words = age(element.dataset.age);
      if (element.textContent !== words) element.textContent = words;
    }
  }

  const events = document.body.dataset.events;
  const lost = document.getElementById("lost");
  const said = document.getElementById("said");
  const live = () => document.getElementById("live");
  let fetching = false;
  let again = false;
  let last = 0;
  let heard = Date.now();
  let alive = false;
  let brokenSince = 0;

  function showLost(yes) {
    if (!lost || lost.hidden === !yes) return;
    const asOf = live()?.dataset.asOf ?? lost.dataset.asOf;
    lost.textContent = yes ? `Live updates lost; showing the water as of ${asOf}.` : "";
    lost.hidden = !yes;
  }

  /* nothing that somebody is typing or reading is taken away from under them */
  function busy(part) {
    const typed = [...part.querySelectorAll("input:not([type=hidden]), textarea")].some(i => i.value !== i.defaultValue);
    return typed || part.contains(document.activeElement) && document.activeElement.matches("input, select, textarea");
  }

  async function refresh() {
    const part = live();
    if (!part) return;
    if (fetching) {
      again = true;
      return;
    }
    if (busy(part)) {
      setTimeout(refresh, 3 * SECOND);
      return;
    }
    fetching = true;
    try {
      const wait = last + SECOND - Date.now();
      if (wait > 0) await new Promise(done => setTimeout(done, wait));
      last = Date.now();
      const answer = await fetch(part.dataset.live, {
        headers: { Accept: "text/html" }, credentials: "same-origin", signal: AbortSignal.timeout(15 * SECOND),
      });
      if (answer.status === 401 || answer.redirected) {
        location.reload();
        return;
      }
      if (!answer.ok) throw new Error(`answer ${answer.status}`);
      const page = new DOMParser().parseFromString(await answer.text(), "text/html");
      const next = page.getElementById("live");
      if (next && !busy(part)) swap(part, next);
      const date = Date.parse(answer.headers.get("Date") ?? "");
      if (!Number.isNaN(date) && Math.abs(Date.now() - date) > 30 * SECOND) skew = Date.now() - date;
      if (brokenSince === 0) showLost(false);
      document.dispatchEvent(new CustomEvent("hingeline:changed"));
    } catch (problem) {
      console.warn("could not refresh", problem);
      broken();
    } finally {
      fetching = false;
      if (again) {
        again = false;
        refresh();
      }
    }
  }

  /* how to find the same button or link in the next version of the page */
  function address(element) {
    if (element.id) return `#${CSS.escape(element.id)}`;
    return element.matches("a[href]") ? `a[href="${CSS.escape(element.getAttribute("href"))}"]` : null;
  }

  function swap(part, next) {
    const focused = part.contains(document.activeElement) ? address(document.activeElement) : null;
    const before = part.dataset.say;
    part.replaceWith(document.adoptNode(next));
    if (focused) next.querySelector(focused)?.focus({ preventScroll: true });
    if (said && before !== next.dataset.say) {
      said.textContent = next.dataset.say;
      if (location.pathname === "/") document.title = document.title.replace(before.trim(), next.dataset.say.trim());
    }
    tick();
  }

  function broken() {
    if (brokenSince === 0) brokenSince = Date.now();
    setTimeout(() => { if (brokenSince !== 0) showLost(true); }, PATIENCE);
  }

  function whole() {
    heard = Date.now();
    brokenSince = 0;
  }

  function listen() {
    const source = new EventSource(events);
    source.addEventListener("open", () => {
      whole();
      refresh(); // what changed before the line stood was told to nobody
    });
    source.addEventListener("changed", () => {
      whole();
      refresh();
    });
    source.addEventListener("alive", () => {
      alive = true;
      whole();
      showLost(false);
    });
    source.addEventListener("error", () => {
      broken();
      if (source.readyState === EventSource.CLOSED) {
        setTimeout(listen, 10 * SECOND);
      }
    });
    const watch = setInterval(() => {
      if (source.readyState === EventSource.CLOSED) {
        clearInterval(watch);
      } else if (alive && Date.now() - heard > SILENCE) {
        clearInterval(watch);
        source.close();
        broken();
        listen();
      }
    }, 10 * SECOND);
  }

  /* a form that came back is met where it is wrong, not at the top of the page */
  addEventListener("load", () => setTimeout(() => document.querySelector("[aria-invalid=true]")?.focus()));

  tick();
  setInterval(tick, 10 * SECOND);
  if (events && live()) {
    listen();
    addEventListener("offline", () => { broken(); showLost(true); });
    addEventListener("online", refresh);
    document.addEventListener("visibilitychange", () => { if (!document.hidden) refresh(); });
    setInterval(() => { if (!document.hidden && Date.now() - last > MINUTE) refresh(); }, MINUTE);
  }
})();
