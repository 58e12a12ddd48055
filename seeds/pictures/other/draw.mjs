/**
 * Draws the stand-in pictures of this folder: `node seeds/pictures/other/draw.mjs` (needs Chromium).
 * The instruments are invented; no outline follows a maker's.
 */
import { writeFile } from 'node:fs/promises';
import { chromium } from 'playwright-core';
import { bowed, electric, plucked } from './shapes.mjs';

const cloths = {
  felt: ['#3c6b4a', '#16301f'],
  slate: ['#8e979b', '#3b4347'],
  oak: ['#c39a66', '#6f4c2a'],
  ink: ['#5b6675', '#242b36'],
  paper: ['#d9cdb4', '#8f8062'],
};

const pictures = {
  cello: {
    cloth: 'slate',
    angle: 9,
    scale: 1.26,
    y: 70,
    draw: bowed('#8c3f1b', '#4c1c0a', { cello: true }),
  },
  violin: { cloth: 'ink', angle: -16, scale: 1.26, y: 70, draw: bowed('#c9792e', '#7a3510', {}) },
  'violin-small': {
    cloth: 'paper',
    angle: 14,
    scale: 1.12,
    y: 70,
    draw: bowed('#d99a4a', '#94521c', {}),
  },
  viola: {
    cloth: 'felt',
    angle: -8,
    scale: 1.3,
    y: 90,
    draw: bowed('#9c5524', '#54240d', { wide: 1.07 }),
  },
  'classical-guitar': {
    cloth: 'slate',
    angle: 11,
    scale: 1.42,
    y: 60,
    draw: plucked({
      top: ['#ecca88', '#c18f45'],
      rim: '#4a2614',
      strings: 6,
      hole: true,
      bridge: 'tie',
    }),
  },
  'archtop-guitar': {
    cloth: 'oak',
    angle: -12,
    scale: 1.42,
    y: 60,
    draw: plucked({
      top: ['#e2a24a', '#2a1209'],
      rim: '#efe3c6',
      strings: 6,
      hole: false,
      bridge: 'floating',
    }),
  },
  'tenor-guitar': {
    cloth: 'ink',
    angle: 15,
    scale: 1.34,
    y: 70,
    draw: plucked({
      top: ['#b5763a', '#6a3a18'],
      rim: '#e9dcbb',
      strings: 4,
      hole: true,
      bridge: 'pin',
      slim: 0.86,
    }),
  },
  'electric-guitar': {
    cloth: 'felt',
    angle: -20,
    scale: 1.45,
    y: 30,
    draw: electric('#8e2a2a', '#4d1215'),
  },
};

function svg({ cloth, angle, scale, y, draw }) {
  const [light, dark] = cloths[cloth];
  return `<svg xmlns="http://www.w3.org/2000/svg" width="1600" height="1200" viewBox="-800 -600 1600 1200"><defs>
<radialGradient id="ground" cx=".42" cy=".36" r=".85"><stop offset="0" stop-color="${light}"/><stop offset="1" stop-color="${dark}"/></radialGradient>
<filter id="weave" x="0" y="0" width="1" height="1"><feTurbulence type="fractalNoise" baseFrequency="${cloth === 'oak' ? '.002 .05' : '.35 .32'}" numOctaves="3" seed="7"/><feColorMatrix values="0 0 0 0 0  0 0 0 0 0  0 0 0 0 0  .9 0 0 0 -.32"/></filter>
<filter id="spruce" x="0" y="0" width="1" height="1"><feTurbulence type="fractalNoise" baseFrequency=".13 .0015" numOctaves="3" seed="4"/><feColorMatrix values="0 0 0 0 .28  0 0 0 0 .13  0 0 0 0 .03  1 0 0 0 -.42"/></filter>
<filter id="flame" x="0" y="0" width="1" height="1"><feTurbulence type="fractalNoise" baseFrequency=".004 .03" numOctaves="2" seed="9"/><feColorMatrix values="0 0 0 0 .2  0 0 0 0 .08  0 0 0 0 .02  1.1 0 0 0 -.42"/></filter>
<filter id="cast" x="-.4" y="-.4" width="1.8" height="1.8"><feGaussianBlur stdDeviation="26"/></filter>
<filter id="near" x="-.6" y="-.6" width="2.2" height="2.2"><feGaussianBlur stdDeviation="5"/></filter>
<filter id="soft" x="-.3" y="-.3" width="1.6" height="1.6"><feGaussianBlur stdDeviation="34"/></filter>
<filter id="grain" x="0" y="0" width="1" height="1"><feTurbulence type="fractalNoise" baseFrequency=".8" numOctaves="1" seed="2"/><feColorMatrix values="0 0 0 0 .5  0 0 0 0 .5  0 0 0 0 .5  .14 0 0 0 -.04"/></filter>
<linearGradient id="ebony" x1="0" x2="1"><stop offset="0" stop-color="#15100e"/><stop offset=".45" stop-color="#3d332d"/><stop offset="1" stop-color="#120d0b"/></linearGradient>
<radialGradient id="fade" r=".75"><stop offset=".55" stop-color="#000" stop-opacity="0"/><stop offset="1" stop-color="#000" stop-opacity=".34"/></radialGradient></defs>
<rect x="-800" y="-600" width="1600" height="1200" fill="url(#ground)"/><rect x="-800" y="-600" width="1600" height="1200" filter="url(#weave)" opacity="${cloth === 'paper' ? 0.22 : 0.4}"/>
<g transform="translate(0 ${y}) rotate(${angle}) scale(${scale})">${draw}</g>
<rect x="-800" y="-600" width="1600" height="1200" filter="url(#grain)"/><rect x="-800" y="-600" width="1600" height="1200" fill="url(#fade)"/></svg>`;
}

const browser = await chromium.launch({
  executablePath: '/usr/bin/chromium',
  args: ['--no-sandbox', '--disable-gpu'],
});
const page = await browser.newPage({ viewport: { width: 1600, height: 1200 } });
for (const [name, picture] of Object.entries(pictures)) {
  await page.setContent(`<body style="margin:0">${svg(picture)}</body>`);
  const jpeg = await page.screenshot({ type: 'jpeg', quality: 72 });
  await writeFile(new URL(`./${name}.jpg`, import.meta.url), jpeg);
  console.log(`${name}.jpg ${jpeg.length}`);
}
await browser.close();
