// Drag along a picture of time to look at that part of it; rest on it to read its values. Without
// script the form, the links and the table beside it do the same.
"use strict";

(() => {
  const SHORTEST_PX = 6;

  const iso = (millis) => new Date(Math.round(millis / 1000) * 1000).toISOString().slice(0, 19) + "Z";

  const drawn = (svg) => {
    const box = svg.getBoundingClientRect();
    const style = getComputedStyle(svg);
    const left = box.left + parseFloat(style.paddingLeft);
    return { left, width: box.right - parseFloat(style.paddingRight) - left };
  };

  const show = (from, to) => {
    const address = new URL(location.href);
    address.searchParams.set("from", iso(from));
    address.searchParams.set("to", iso(to));
    location.assign(address);
  };

  const brush = (svg) => {
    const from = Number(svg.dataset.from);
    const to = Number(svg.dataset.to);
    const mark = document.createElement("div");
    mark.className = "brush";
    mark.hidden = true;
    svg.parentElement.classList.add("brushed");
    svg.parentElement.append(mark);
    let start = null;

    const at = (event) => {
      const { left, width } = drawn(svg);
      return Math.min(width, Math.max(0, event.clientX - left));
    };

    const draw = (x) => {
      const offset = drawn(svg).left - svg.parentElement.getBoundingClientRect().left;
      mark.hidden = false;
      mark.style.left = `${offset + Math.min(start, x)}px`;
      mark.style.width = `${Math.abs(x - start)}px`;
    };

    const stop = () => {
      start = null;
      mark.hidden = true;
    };

    svg.addEventListener("pointerdown", (event) => {
      if (event.isPrimary && event.button === 0) {
        start = at(event);
        svg.setPointerCapture(event.pointerId);
        event.preventDefault();
      }
    });
    svg.addEventListener("pointermove", (event) => {
      if (start !== null) {
        draw(at(event));
      }
    });
    svg.addEventListener("pointerup", (event) => {
      if (start !== null) {
        const end = at(event);
        const width = drawn(svg).width;
        const wide = Math.abs(end - start) >= SHORTEST_PX;
        const [a, b] = [Math.min(start, end), Math.max(start, end)];
        stop();
        if (wide) {
          show(from + ((to - from) * a) / width, from + ((to - from) * b) / width);
        }
      }
    });
    svg.addEventListener("pointercancel", stop);
    addEventListener("keydown", (event) => event.key === "Escape" && stop());
  };

  const figure = (value) => {
    const size = Math.abs(value);
    const decimals = size >= 1000 ? 0 : size >= 100 ? 1 : size >= 10 ? 2 : 3;
    return value.toFixed(decimals).replace("-", "\u2212");
  };

  const readout = (holder) => {
    const svg = holder.querySelector("svg[data-from]");
    const { address, quantities, places, factor, unit } = holder.dataset;
    const words = document.createElement("p");
    words.className = "readout";
    const line = document.createElement("div");
    line.className = "cursor";
    line.hidden = true;
    holder.append(line, words);
    let series = null;

    const load = () => {
      const one = (q) => fetch(`${address}&quantity=${encodeURIComponent(q)}`).then((r) => r.json());
      series ??= Promise.all(quantities.split(" ").map(one)).catch(() => []);
      return series;
    };

    const told = (all, millis) => {
      const steps = all[0].steps;
      let k = steps.findIndex((step) => Date.parse(step.start) > millis);
      k = (k < 0 ? steps.length : k) - 1;
      const when = steps[Math.max(0, k)].start.slice(0, 16).replace("T", " ");
      const names = places.split(" ");
      const values = all.map((s, i) => {
        const { min, mean, max } = s.steps[Math.max(0, k)];
        const scaled = (v) => figure(v * factor);
        const range = min === max ? "" : ` (${scaled(min)} to ${scaled(max)})`;
        return `${names[i]} ${mean === null ? "\u2013" : scaled(mean) + range}`;
      });
      return `${when}: ${values.join(", ")} ${unit}`;
    };

    svg.addEventListener("pointermove", async (event) => {
      const { left, width } = drawn(svg);
      const share = (event.clientX - left) / width;
      const inside = share >= 0 && share < 1;
      line.hidden = !inside;
      line.style.left = `${event.clientX - holder.getBoundingClientRect().left}px`;
      const all = await load();
      if (inside && all.length > 0) {
        words.textContent = told(all, Number(svg.dataset.from) + share * (svg.dataset.to - svg.dataset.from));
      }
    });
    svg.addEventListener("pointerleave", () => {
      line.hidden = true;
    });
  };

  document.querySelectorAll("[data-quantities]").forEach(readout);
  document.querySelectorAll("svg[data-from]").forEach(brush);
  document.getElementById("brush-how")?.removeAttribute("hidden");
})();
