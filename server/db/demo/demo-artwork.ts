/** Logos drawn for the demo. Every client is invented. */
const svg = (widthMm: number, heightMm: number, inner: string) =>
  `<svg xmlns="http://www.w3.org/2000/svg" width="${widthMm}mm" height="${heightMm}mm" viewBox="0 0 ${widthMm} ${heightMm}">${inner}</svg>`;

const lettering = (text: string, at: { x: number; y: number; size: number; colour: string }) =>
  `<text x="${at.x}" y="${at.y}" font-family="Merriweather" font-weight="900" font-size="${at.size}" letter-spacing="1.5" text-anchor="middle" fill="${at.colour}">${text}</text>`;

const midnight = "#27314F";
const brass = "#C8992F";

/** Planets on rings; the disc under them is a plate that the maker adds. */
export const orrerySvg = svg(
  520,
  330,
  `<g fill="none" stroke="${brass}" stroke-width="5"><circle cx="260" cy="112" r="92"/><circle cx="260" cy="112" r="66"/><circle cx="260" cy="112" r="40"/></g>` +
    `<circle cx="260" cy="112" r="20" fill="#E8B84A"/>` +
    `<g fill="#F4EFE4"><circle cx="345" cy="77" r="11"/><circle cx="174" cy="80" r="8.5"/></g>` +
    `<circle cx="211" cy="156" r="9" fill="#B4523B"/><circle cx="296" cy="130" r="7" fill="#86A796"/>` +
    lettering("ORRERY BOOKS", { x: 260, y: 312, size: 58, colour: midnight }),
);

const ear = (x: number, turn: number) => {
  const grain = (side: number, y: number) =>
    `<ellipse cx="${side * 12}" cy="${y}" rx="6" ry="14" transform="rotate(${side * 32} ${side * 12} ${y})"/>`;
  const rows = [-70, -46, -22, 2].flatMap((y) => [grain(-1, y), grain(1, y)]).join("");
  return `<g transform="translate(${x} 118) rotate(${turn})">${rows}<ellipse cx="0" cy="-92" rx="6" ry="15"/><rect x="-2.5" y="-80" width="5" height="160"/></g>`;
};

/** Two ears of wheat over a name. */
export const wheatSvg = svg(
  360,
  300,
  `<g fill="#E8B84A">${ear(138, -14)}${ear(222, 14)}</g>${lettering("MARLOW &amp; PIKE", { x: 180, y: 270, size: 34, colour: "#F4EFE4" })}`,
);

const oar = (turn: number, colour: string) =>
  `<g transform="translate(210 110) rotate(${turn})" fill="${colour}"><rect x="-150" y="-4" width="240" height="8" rx="3"/><path d="M88-13h58c9 0 16 6 16 13s-7 13-16 13H88z"/></g>`;

/** Crossed oars under a ball, with the club's name. */
export const oarsSvg = svg(
  420,
  280,
  `${oar(-32, "#34416B")}${oar(212, "#34416B")}<circle cx="210" cy="110" r="24" fill="#96372B"/>${lettering("SALTGRASS", { x: 210, y: 262, size: 44, colour: "#34416B" })}`,
);

/** A plate for the boat racks. */
export const rackSvg = svg(200, 90, lettering("RACK 4", { x: 100, y: 64, size: 48, colour: "#28685C" }));
