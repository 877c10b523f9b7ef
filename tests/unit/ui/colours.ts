type Triple = [number, number, number];

/** The hexadecimal custom properties of one block of a stylesheet, by name without dashes. */
export function readScheme(css: string, selector: string): Record<string, string> {
  const start = css.indexOf(`${selector} {`);
  if (start < 0) throw new Error(`The stylesheet has no block ${selector}`);
  const block = css.slice(start, css.indexOf('}', start));
  return Object.fromEntries([...block.matchAll(/--([\w-]+):\s*(#[0-9a-f]{6})/gi)].map((match) => [match[1], match[2]]));
}

function linearOf(hex: string): Triple {
  if (!/^#[0-9a-f]{6}$/i.test(hex)) throw new Error(`${hex} is not a colour`);
  return [1, 3, 5].map((start) => {
    const value = parseInt(hex.slice(start, start + 2), 16) / 255;
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
  }) as Triple;
}

/** Contrast ratio of WCAG 2.2. */
export function contrastOf(one: string, other: string): number {
  const luminance = (hex: string) => {
    const [red, green, blue] = linearOf(hex);
    return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
  };
  const [light, dark] = [luminance(one), luminance(other)].sort((a, b) => b - a);
  return (light + 0.05) / (dark + 0.05);
}

/** Full dichromacy after Machado, Oliveira and Fernandes 2009, doi:10.1109/TVCG.2009.113; rows act on linear sRGB. */
const visions: Record<string, Triple[]> = {
  normal: [[1, 0, 0], [0, 1, 0], [0, 0, 1]],
  protan: [[0.152286, 1.052583, -0.204868], [0.114503, 0.786281, 0.099216], [-0.003882, -0.048116, 1.051998]],
  deutan: [[0.367322, 0.860646, -0.227968], [0.280085, 0.672501, 0.047413], [-0.01182, 0.04294, 0.968881]],
  tritan: [[1.255528, -0.076749, -0.178779], [-0.078411, 0.930809, 0.147602], [0.004733, 0.691367, 0.3039]],
};

/** Linear sRGB to OKLab (Ottosson 2020). */
function oklabOf([red, green, blue]: Triple): Triple {
  const long = Math.cbrt(0.4122214708 * red + 0.5363325363 * green + 0.0514459929 * blue);
  const middle = Math.cbrt(0.2119034982 * red + 0.6806995451 * green + 0.1073969566 * blue);
  const short = Math.cbrt(0.0883024619 * red + 0.2817188376 * green + 0.6299787005 * blue);
  return [
    0.2104542553 * long + 0.793617785 * middle - 0.0040720468 * short,
    1.9779984951 * long - 2.428592205 * middle + 0.4505937099 * short,
    0.0259040371 * long + 0.7827717662 * middle - 0.808675766 * short,
  ];
}

/** The least distance of any two colours under any vision, in OKLab times 100. */
export function leastDistance(colours: readonly string[]): number {
  const distances = Object.values(visions).flatMap((matrix) => {
    const seen = colours.map((hex) => {
      const colour = linearOf(hex);
      return oklabOf(matrix.map((row) => Math.min(1, Math.max(0, row[0] * colour[0] + row[1] * colour[1] + row[2] * colour[2]))) as Triple);
    });
    return seen.flatMap((one, index) => seen.slice(0, index).map((other) => Math.hypot(one[0] - other[0], one[1] - other[1], one[2] - other[2]) * 100));
  });
  return Math.min(...distances);
}
