
//<![CDATA[
(function () {
  "use strict";
  var SVG = "http://www.w3.org/2000/svg";
  var OUTSIDE = 255;
  var ARROWS = "→↗↑↖←↙↓↘";

  function bytes(base64) {
    var text = atob(base64);
    var out = new Uint8Array(text.length);
    for (var i = 0; i < text.length; i++) {
      out[i] = text.charCodeAt(i);
    }
    return out;
  }

  function two(value) {
    return value === 0 ? "0" : Number(value.toPrecision(2)).toString();
  }

  // The frame of a plot that a place lies in; the one drawn last lies on top.
  function frameAt(plot, x, y) {
    for (var i = plot.frames.length - 1; i >= 0; i--) {
      var b = plot.frames[i].box;
      if (x >= b[0] && x <= b[2] && y >= b[1] && y <= b[3]) {
        return plot.frames[i];
      }
    }
    return null;
  }

  // The square of the frame's grid under a place of the plot.
  function squareAt(table, frame, x, y) {
    var grid = table.grids[frame.grid];
    return {
      frame: frame,
      grid: grid,
      column: Math.floor((frame.x + (x - frame.box[0]) * frame.perPoint - grid.left) / grid.step),
      row: Math.floor((grid.top - frame.y + (y - frame.box[1]) * frame.perPoint) / grid.step)
    };
  }

  function words(table, at) {
    var g = at.grid;
    var decimals = Math.max(0, Math.ceil(-Math.log10(g.step)));
    var place = "(" + (g.left + (at.column + 0.5) * g.step).toFixed(decimals) + ", "
        + (g.top - (at.row + 0.5) * g.step).toFixed(decimals) + ") " + table.unit;
    var inside = at.column >= 0 && at.column < g.columns && at.row >= 0 && at.row < g.rows;
    var i = at.row * g.columns + at.column;
    if (!inside || g.material[i] === OUTSIDE) {
      return place + ": outside the section";
    }
    var part = (g.t[2 * i] + 256 * g.t[2 * i + 1]) / 65535;
    var degrees = g.least + part * (g.most - g.least);
    var flow = g.q[i] === 0
        ? "less than " + two(g.greatest * Math.pow(10, -table.orders)) + " " + table.density
        : two(g.greatest * Math.pow(10, (g.q[i] / 255 - 1) * table.orders)) + " "
            + table.density + " " + ARROWS.charAt(Math.round(g.turn[i] / 32) % 8);
    return place + ": " + degrees.toFixed(1) + " " + table.degrees + ", " + flow + ", "
        + (table.materials[g.material[i]] || "");
  }

  function attach(table, plot) {
    var box = document.querySelector("#figure-" + plot.id + " .plot");
    var svg = box && box.querySelector("svg");
    if (!svg || !svg.getScreenCTM) {
      return;
    }
    var rest = "Point at the section, or focus it and use the arrow keys (with Shift ten steps):"
        + " temperature, heat flow and material there, estimates read from a grid of "
        + two(table.grids[plot.frames[0].grid].step) + " " + table.unit + ".";
    var out = document.createElement("output");
    out.className = "sounding";
    out.id = plot.id + "-sounding";
    out.textContent = rest;
    out.setAttribute("aria-live", "polite");
    box.insertAdjacentElement("afterend", out);
    box.tabIndex = 0;
    box.setAttribute("role", "group");
    box.setAttribute("aria-label", "Read values: arrow keys move the mark");
    box.setAttribute("aria-describedby", out.id);
    var mark = document.createElementNS(SVG, "path");
    mark.setAttribute("d", "M-9 0h6M3 0h6M0-9v6M0 3v6");
    mark.setAttribute("stroke", "#000000");
    mark.setAttribute("stroke-width", "1.6");
    mark.setAttribute("visibility", "hidden");
    mark.setAttribute("aria-hidden", "true");
    svg.appendChild(mark);
    var first = plot.frames[0];
    var grid = table.grids[first.grid];
    var at = { frame: first, grid: grid, column: grid.columns >> 1, row: grid.rows >> 1 };

    function show(found, marked) {
      at = found;
      out.textContent = words(table, at);
      var f = at.frame;
      var x = f.box[0] + (at.grid.left + (at.column + 0.5) * at.grid.step - f.x) / f.perPoint;
      var y = f.box[1] + (f.y - at.grid.top + (at.row + 0.5) * at.grid.step) / f.perPoint;
      mark.setAttribute("visibility", marked ? "visible" : "hidden");
      mark.setAttribute("transform", "translate(" + x + " " + y + ")");
    }

    box.addEventListener("pointermove", function (event) {
      var point = new DOMPoint(event.clientX, event.clientY)
          .matrixTransform(svg.getScreenCTM().inverse());
      var frame = frameAt(plot, point.x, point.y);
      if (frame) {
        show(squareAt(table, frame, point.x, point.y), false);
      }
    });
    box.addEventListener("pointerleave", function () {
      out.textContent = rest;
    });
    box.addEventListener("blur", function () {
      mark.setAttribute("visibility", "hidden");
      out.textContent = rest;
    });
    box.addEventListener("keydown", function (event) {
      var by = event.shiftKey ? 10 : 1;
      var right = { ArrowRight: by, ArrowLeft: -by }[event.key] || 0;
      var down = { ArrowDown: by, ArrowUp: -by }[event.key] || 0;
      if (right === 0 && down === 0) {
        return;
      }
      event.preventDefault();
      show({
        frame: at.frame,
        grid: at.grid,
        column: Math.max(0, Math.min(at.grid.columns - 1, at.column + right)),
        row: Math.max(0, Math.min(at.grid.rows - 1, at.row + down))
      }, true);
    });
  }

  var table = JSON.parse(document.getElementById("soundings").textContent);
  table.grids.forEach(function (g) {
    g.t = bytes(g.t);
    g.q = bytes(g.q);
    g.turn = bytes(g.turn);
    g.material = bytes(g.material);
  });
  table.plots.forEach(function (plot) {
    attach(table, plot);
  });
}());
//]]>
