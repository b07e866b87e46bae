(function () {
  'use strict';
  var tip = document.getElementById('tip');
  function show(target, x, y) {
    var title = target.querySelector('title');
    var text = target.getAttribute('data-tip') || (title ? title.textContent : '');
    if (!text) { return; }
    // The browser's own title would appear as well, later: keep the text, drop the title.
    if (title) { target.setAttribute('data-tip', text); target.removeChild(title); }
    tip.textContent = text;
    tip.hidden = false;
    tip.style.left = Math.min(x + 14, window.innerWidth - tip.offsetWidth - 6) + 'px';
    tip.style.top = Math.max(6, Math.min(y + 14, window.innerHeight - tip.offsetHeight - 6)) + 'px';
  }
  document.addEventListener('pointerover', function (event) {
    var target = event.target;
    if (target.closest && target.closest('svg.figure') && target.tagName === 'circle') {
      show(target, event.clientX, event.clientY);
    }
  });
  document.addEventListener('pointerout', function (event) {
    if (event.target.tagName === 'circle') { tip.hidden = true; }
  });

  function numbers(text, separator) { return text.split(separator).map(Number); }
  function attach(svg) {
    var view = numbers(svg.getAttribute('data-view'), ' ');
    var state = { azimuth: view[0], elevation: view[1] };
    var scale = view[2], shiftX = view[3], shiftY = view[4];
    var items = Array.prototype.map.call(svg.querySelectorAll('[data-p]'), function (element) {
      return {
        element: element,
        points: element.getAttribute('data-p').split(';').map(function (p) { return numbers(p, ' '); }),
        offset: element.hasAttribute('data-o') ? numbers(element.getAttribute('data-o'), ' ') : [0, 0]
      };
    });
    // Turning is about the middle of the structure, so that it stays in the picture.
    var middle = [0, 1, 2].map(function (k) {
      var low = Infinity, high = -Infinity;
      items.forEach(function (item) {
        item.points.forEach(function (p) { low = Math.min(low, p[k]); high = Math.max(high, p[k]); });
      });
      return (low + high) / 2;
    });
    function turned(p, azimuth, elevation) {
      var a = azimuth * Math.PI / 180, e = elevation * Math.PI / 180;
      var right = Math.cos(a) * p[0] - Math.sin(a) * p[1];
      var depth = Math.sin(a) * p[0] + Math.cos(a) * p[1];
      return [right, -(p[2] * Math.cos(e) + depth * Math.sin(e))];
    }
    var home = turned(middle, view[0], view[1]);
    var centre = [shiftX + scale * home[0], shiftY + scale * home[1]];
    function draw() {
      var now = turned(middle, state.azimuth, state.elevation);
      items.forEach(function (item) {
        var at = item.points.map(function (p) {
          var q = turned(p, state.azimuth, state.elevation);
          return [centre[0] + scale * (q[0] - now[0]), centre[1] + scale * (q[1] - now[1])];
        });
        var element = item.element;
        if (element.tagName === 'circle') {
          element.setAttribute('cx', at[0][0].toFixed(1));
          element.setAttribute('cy', at[0][1].toFixed(1));
        } else if (element.tagName === 'text') {
          element.setAttribute('x', (at[0][0] + item.offset[0]).toFixed(1));
          element.setAttribute('y', (at[0][1] + item.offset[1]).toFixed(1));
        } else {
          element.setAttribute('points', at.map(function (p) {
            return p[0].toFixed(1) + ',' + p[1].toFixed(1);
          }).join(' '));
        }
      });
    }
    function turn(azimuth, elevation) {
      state.azimuth += azimuth;
      state.elevation = Math.max(-90, Math.min(90, state.elevation + elevation));
      draw();
    }
    var last = null;
    svg.setAttribute('tabindex', '0');
    svg.addEventListener('pointerdown', function (event) {
      last = [event.clientX, event.clientY];
      if (svg.setPointerCapture) { svg.setPointerCapture(event.pointerId); }
    });
    svg.addEventListener('pointermove', function (event) {
      if (!last) { return; }
      turn(-(event.clientX - last[0]) * 0.5, (event.clientY - last[1]) * 0.5);
      last = [event.clientX, event.clientY];
    });
    ['pointerup', 'pointercancel'].forEach(function (name) {
      svg.addEventListener(name, function () { last = null; });
    });
    svg.addEventListener('keydown', function (event) {
      var steps = { ArrowLeft: [5, 0], ArrowRight: [-5, 0], ArrowUp: [0, 5], ArrowDown: [0, -5] };
      var step = steps[event.key];
      if (step) { turn(step[0], step[1]); event.preventDefault(); }
    });
  }
  Array.prototype.forEach.call(document.querySelectorAll('svg.space'), attach);
}());
