// The sign: a path of three bonds, read from the measured square over the calculated circle to the judged diamond.
const LIGHT = { measured: '#1D4F91', calculated: '#0B6B5D', judged: '#9C3D12', ink: '#1C2430' };
const DARK = { measured: '#8DB4EA', calculated: '#6CC7B4', judged: '#F0A27C', ink: '#ECE7DC' };
const GROUND = { light: '#F7F4EC', dark: '#14181F' };
const BOX = '0 0 32.4 32.4'; // the heavier cut reaches a fifth of a unit over the square

function parts({ small, paint }) {
  const square = small ? 4.8 : 4.2;
  const diamond = small ? 5.8 : 5.2;
  return [
    `<path d="M5 22 11.5 11.5 20.5 20.5 27 10" fill="none" ${paint('ink', 'stroke')} stroke-width="${small ? 3 : 2.2}" stroke-linecap="round" stroke-linejoin="round"/>`,
    `<circle cx="16" cy="16" r="${small ? 4.2 : 4}" ${paint('calculated', 'fill')}/>`,
    `<rect x="${(5 - square).toFixed(1)}" y="${(22.4 - square).toFixed(1)}" width="${2 * square}" height="${2 * square}" ${paint('measured', 'fill')}/>`,
    `<path d="M26.4 ${(10 - diamond).toFixed(1)}l${diamond} ${diamond}l-${diamond} ${diamond}l-${diamond} -${diamond}Z" ${paint('judged', 'fill')}/>`,
  ].join('');
}

const paintWith = (inks) => (ink, attribute) => `${attribute}="${inks[ink]}"`;

/** The sign on a clear ground, in the inks of the light theme. */
export function signSvg({ small = false, inks = LIGHT } = {}) {
  return `<svg xmlns="http://www.w3.org/2000/svg" viewBox="${small ? BOX : '0 0 32 32'}" width="32" height="32">${parts({ small, paint: paintWith(inks) })}</svg>`;
}

/** The tab's icon: the heavier cut, in the inks of the browser's theme. */
function faviconSvg() {
  const rule = (inks) => Object.entries(inks).map(([name, colour]) => `.f-${name}{fill:${colour}}.s-${name}{stroke:${colour}}`).join('');
  const paint = (ink, attribute) => `class="${attribute === 'fill' ? 'f' : 's'}-${ink}"`;
  return `<svg xmlns="http://www.w3.org/2000/svg" viewBox="${BOX}" width="32" height="32"><style>${rule(LIGHT)}@media (prefers-color-scheme:dark){${rule(DARK)}}</style>${parts({ small: true, paint })}</svg>`;
}

/** The sign on ink; `share` is the part of the width it takes, `round` the corner's part of it. */
function appIcon({ share, round }) {
  const scale = (512 * share) / 32;
  const shift = (512 - 32 * scale) / 2;
  return `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 512 512" width="512" height="512"><rect width="512" height="512" rx="${512 * round}" fill="${GROUND.dark}"/><g transform="translate(${shift} ${shift}) scale(${scale})">${parts({ small: false, paint: paintWith(DARK) })}</g></svg>`;
}

/** Every icon of the web shell: name in public/, size of a PNG, and its drawing. */
export function iconFiles() {
  const rounded = appIcon({ share: 0.76, round: 0.2 });
  return [
    { name: 'favicon.svg', svg: faviconSvg() },
    { name: 'favicon-32.png', size: 32, svg: signSvg({ small: true }) },
    { name: 'icon-192.png', size: 192, svg: rounded },
    { name: 'icon-512.png', size: 512, svg: rounded },
    // masks may cut away a fifth on each side, so the sign keeps to the middle
    { name: 'icon-maskable-512.png', size: 512, svg: appIcon({ share: 0.56, round: 0 }) },
    { name: 'apple-touch-icon.png', size: 180, svg: appIcon({ share: 0.7, round: 0 }) },
  ];
}
