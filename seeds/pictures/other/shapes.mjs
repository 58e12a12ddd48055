/** Outlines in a box of about 450 x 720 around (0, 0), neck upwards. Light comes from the upper left. */

/** Closes the right half of an outline with its mirror image. `right` is a list of cubic curves from the top to the tail. */
function mirrored(top, right) {
  const points = [[0, top], ...right.flat()];
  const back = [...points].reverse().slice(1);
  const curve = (list, side) =>
    list
      .reduce((rows, p, i) => (i % 3 ? rows.at(-1).push(p) : rows.push([p])) && rows, [])
      .map((row) => `C${row.map(([x, y]) => `${side * x} ${y}`).join(' ')}`)
      .join('');
  return `M0 ${top}${curve(points.slice(1), 1)}${curve(back, -1)}Z`;
}

const shadow = (d, dx = 26, dy = 34) =>
  `<path d="${d}" transform="translate(${dx} ${dy})" fill="#000" opacity=".55" filter="url(#cast)"/>`;

const near = (d) =>
  `<path d="${d}" transform="translate(7 9)" fill="#000" opacity=".5" filter="url(#near)"/>`;

/** An arched plate: colour deepening to the edge, grain, a highlight, a bound and purfled edge. */
function plate(id, d, [light, dark], { grain = 'spruce', rim, burst = 0.7 }) {
  return `<clipPath id="${id}"><path d="${d}"/></clipPath><radialGradient id="${id}g" cx=".46" cy=".46" r="${burst}"><stop offset="0" stop-color="${light}"/><stop offset=".55" stop-color="${light}"/><stop offset="1" stop-color="${dark}"/></radialGradient>
<path d="${d}" fill="url(#${id}g)"/><g clip-path="url(#${id})"><rect x="-300" y="-420" width="600" height="840" filter="url(#${grain})" opacity=".55"/>
<ellipse cx="-70" cy="-60" rx="90" ry="230" fill="#fff3d6" opacity=".26" filter="url(#soft)"/><path d="${d}" fill="none" stroke="#000" stroke-opacity=".4" stroke-width="30" filter="url(#near)"/>
<path d="${d}" fill="none" stroke="${rim}" stroke-width="13"/><path d="${d}" fill="none" stroke="#1a0d06" stroke-opacity=".75" stroke-width="26" opacity=".18"/></g><path d="${d}" fill="none" stroke="#160b05" stroke-width="3"/>`;
}

const strings = (count, from, to, spread) =>
  Array.from({ length: count }, (_, i) => {
    const at = count === 1 ? 0 : (2 * i) / (count - 1) - 1;
    return `<path d="M${at * spread[0]} ${from}L${at * spread[1]} ${to}" stroke="#efe6d2" stroke-opacity=".9" stroke-width="${1.4 + 0.5 * i * 0.4}"/>`;
  }).join('');

const board = (top, foot, w0, w1) =>
  `M${-w0} ${top}L${w0} ${top}L${w1} ${foot}Q0 ${foot + 10} ${-w1} ${foot}Z`;

/** Frets of a scale from `nut` to `bridge` that lie on the board: y = nut + scale (1 − 2^(−n/12)). */
const frets = (nut, bridge, foot, w0, w1) =>
  Array.from({ length: 20 }, (_, n) => nut + (bridge - nut) * (1 - 2 ** (-(n + 1) / 12)))
    .filter((y) => y < foot - 4)
    .map((y) => {
      const w = w0 + ((w1 - w0) * (y - nut)) / (foot - nut);
      return `<path d="M${-w} ${y}H${w}" stroke="#d8d2c4" stroke-width="3"/><path d="M${-w} ${y + 2.5}H${w}" stroke="#000" stroke-opacity=".5" stroke-width="2"/>`;
    })
    .join('');

const soundholes = (k = 1) =>
  [1, -1]
    .map(
      (s) =>
        `<g transform="scale(${s * k} ${k})" stroke="#140a05" fill="none" stroke-linecap="round"><path d="M66 -62C48 -38 72 -10 82 14C92 40 84 66 108 74" stroke-width="10"/><path d="M77 8L93 4" stroke-width="4"/><circle cx="72" cy="-64" r="6" fill="#140a05"/><circle cx="103" cy="77" r="8" fill="#140a05"/></g>`,
    )
    .join('');

/** Violin, viola, cello. */
export function bowed(light, dark, { cello = false, wide = 1 }) {
  const d = mirrored(-352, [
    [
      [62, -364],
      [122, -350],
      [152, -308],
    ],
    [
      [182, -266],
      [178, -190],
      [166, -152],
    ],
    [
      [160, -130],
      [170, -114],
      [186, -106],
    ],
    [
      [150, -92],
      [118, -60],
      [116, -8],
    ],
    [
      [114, 42],
      [142, 84],
      [200, 94],
    ],
    [
      [188, 106],
      [190, 124],
      [202, 152],
    ],
    [
      [226, 212],
      [216, 292],
      [162, 330],
    ],
    [
      [112, 360],
      [52, 362],
      [0, 360],
    ],
  ]);
  const neck = board(-900, -70, 26, 38);
  const tail = 'M-28 128Q0 118 28 128L15 322Q0 338 -15 322Z';
  const rest = 'M-150 292Q-140 236 -84 240Q-34 246 -40 304Q-44 336 -92 338Q-150 338 -150 292Z';
  const body = `${shadow(d)}${plate('p', d, [light, dark], { rim: dark, burst: 0.62 })}${soundholes()}`;
  const pin = `<path d="M0 356V${cello ? 520 : 372}" stroke="#15100e" stroke-width="${cello ? 9 : 16}" stroke-linecap="round"/>`;
  const bridge = 'M-48 34Q0 22 48 34L44 46Q0 38 -44 46Z';
  return `<g transform="scale(${wide} 1)">${pin}${body}</g>${cello ? '' : `${near(rest)}<path d="${rest}" fill="url(#ebony)"/>`}
${near(tail)}<path d="${tail}" fill="url(#ebony)"/>${near(neck)}<path d="${neck}" fill="url(#ebony)"/>${near(bridge)}<path d="${bridge}" fill="#e2c48c"/>
${strings(4, -900, 34, [15, 30])}${strings(4, 34, 140, [30, 18])}`;
}

/** Classical, tenor and arched-top guitar. */
export function plucked({ top, rim, strings: count, hole, bridge, slim = 1 }) {
  const d = mirrored(-330, [
    [
      [86, -346],
      [168, -322],
      [178, -232],
    ],
    [
      [184, -160],
      [142, -122],
      [140, -68],
    ],
    [
      [138, 2],
      [216, 44],
      [224, 152],
    ],
    [
      [230, 262],
      [152, 338],
      [0, 340],
    ],
  ]);
  const half = count * 5.2;
  const neck = board(-900, hole ? -138 : -150, half - 4, half + 2);
  const saddle = hole ? 156 : 96;
  const rosette = `<circle cy="-62" r="82" fill="none" stroke="#2b1409" stroke-width="3"/><circle cy="-62" r="74" fill="none" stroke="#7c4a1d" stroke-width="9" stroke-dasharray="7 4"/><circle cy="-62" r="66" fill="none" stroke="#2b1409" stroke-width="3"/><circle cy="-62" r="60" fill="#1a0e07"/><path d="M-58 -62A58 58 0 0 1 30 -112" fill="none" stroke="#000" stroke-width="14" opacity=".5"/>`;
  const bar =
    bridge === 'floating'
      ? `M-58 ${saddle - 8}H58V${saddle + 8}H-58Z`
      : `M-${bridge === 'tie' ? 112 : 84} ${saddle - 6}Q0 ${saddle - 20} ${bridge === 'tie' ? 112 : 84} ${saddle - 6}V${saddle + 22}Q0 ${saddle + 30} -${bridge === 'tie' ? 112 : 84} ${saddle + 22}Z`;
  const guard = 'M38 -132L84 -84Q92 -30 62 44L44 40Z';
  const tail = `<path d="M-30 ${saddle + 60}H30L12 338H-12Z" fill="#c9c3b4" stroke="#57524a" stroke-width="2"/>`;
  return `<g transform="scale(${slim} 1)">${shadow(d)}${plate('p', d, top, { rim, burst: hole ? 0.72 : 0.6 })}</g>
${hole ? rosette : `${soundholes(1.08)}${near(guard)}<path d="${guard}" fill="#241a14"/>${tail}`}
${near(neck)}<path d="${neck}" fill="url(#ebony)"/>${frets(-640, saddle, hole ? -138 : -150, half - 3, half + 2)}
${near(bar)}<path d="${bar}" fill="#3a2013"/><path d="M-${half + 16} ${saddle}H${half + 16}" stroke="#efe6d0" stroke-width="5"/>
${bridge === 'pin' ? pins(count, half, saddle) : ''}${strings(count, -900, saddle, [half - 8, half + 6])}${hole ? '' : strings(count, saddle, saddle + 66, [half + 6, 22])}`;
}

const pins = (count, half, saddle) =>
  Array.from({ length: count }, (_, i) => {
    const at = (2 * i) / (count - 1) - 1;
    return `<circle cx="${at * (half + 6)}" cy="${saddle + 13}" r="5" fill="#f3ead4" stroke="#1a0e07"/>`;
  }).join('');

/** A solid body with one deep cutaway and two pickups. */
export function electric(light, dark) {
  const d =
    'M-40 -262C-96 -262 -128 -306 -166 -286C-214 -258 -178 -168 -158 -110C-142 -62 -170 -20 -206 50C-252 148 -226 300 -96 322C-20 334 34 300 96 312C206 330 250 214 206 96C184 36 132 6 128 -44C126 -92 180 -124 158 -168C136 -204 96 -170 74 -176C52 -182 48 -262 40 -262Z';
  const neck = board(-900, -196, 25, 30);
  const unit = (y) =>
    `<g transform="translate(0 ${y})"><rect x="-56" y="-20" width="112" height="40" rx="9" fill="#000" opacity=".5" filter="url(#near)" transform="translate(5 7)"/><rect x="-56" y="-20" width="112" height="40" rx="9" fill="#e9dfc6"/>${[-40, -24, -8, 8, 24, 40].map((x) => `<circle cx="${x}" r="4.500" fill="#8e877a"/>`).join('')}</g>`;
  const knob = (x, y) =>
    `<circle cx="${x + 5}" cy="${y + 7}" r="20" fill="#000" opacity=".5" filter="url(#near)"/><circle cx="${x}" cy="${y}" r="19" fill="#241a14"/><circle cx="${x - 4}" cy="${y - 5}" r="10" fill="#4b3d34"/>`;
  return `${shadow(d)}${plate('p', d, [light, dark], { grain: 'flame', rim: dark, burst: 0.8 })}<path d="M-150 -170C-150 -90 -190 20 -196 120" fill="none" stroke="#fff" stroke-width="16" opacity=".22" filter="url(#near)"/>
${near(neck)}<path d="${neck}" fill="url(#ebony)"/>${frets(-640, 120, -196, 25, 30)}${unit(-130)}${unit(40)}
<rect x="-62" y="104" width="124" height="34" rx="5" fill="#bdb8ab" stroke="#55514a" stroke-width="2"/>${knob(120, 150)}${knob(128, 214)}${strings(6, -900, 120, [19, 38])}`;
}
