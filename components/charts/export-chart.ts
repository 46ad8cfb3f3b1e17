const COPIED_STYLES = [
  'fill',
  'fill-opacity',
  'stroke',
  'stroke-width',
  'stroke-dasharray',
  'stroke-linejoin',
  'font-size',
  'font-style',
  'font-weight',
  'text-anchor',
  'color',
] as const;
const FONT = "'Source Sans 3', 'Source Sans Pro', Arial, sans-serif";
const NAMESPACE = 'http://www.w3.org/2000/svg';
const PNG_SCALE = 2;

/** The chart as a file of its own: styles written out, on light paper, with title and description. */
export function chartToSvg(svg: SVGSVGElement, note: string): string {
  const copy = withLightTheme(() => copyWithStyles(svg));
  const { width, height } = svg.viewBox.baseVal;
  copy.setAttribute('xmlns', NAMESPACE);
  copy.setAttribute('width', String(width));
  copy.setAttribute('height', String(height));
  copy.setAttribute('font-family', FONT);
  const title = document.createElementNS(NAMESPACE, 'title');
  title.textContent = svg.getAttribute('aria-label');
  const description = copy.querySelector('desc');
  if (description) description.textContent = `${description.textContent} ${note}`;
  copy.prepend(title);
  return new XMLSerializer().serializeToString(copy);
}

function copyWithStyles(svg: SVGSVGElement): SVGSVGElement {
  const copy = svg.cloneNode(true) as SVGSVGElement;
  const copies = [copy, ...copy.querySelectorAll<SVGElement>('*')];
  [svg, ...svg.querySelectorAll<SVGElement>('*')].forEach((original, index) => {
    const target = copies[index];
    if (!target || original instanceof SVGDescElement) return;
    writeStyles(target, original, original === svg ? null : original.parentElement);
    for (const name of ['class', 'tabindex', 'role', 'data-detail', 'data-chart'])
      target.removeAttribute(name);
  });
  const ground = document.createElementNS(NAMESPACE, 'rect');
  ground.setAttribute('width', '100%');
  ground.setAttribute('height', '100%');
  ground.setAttribute('fill', getComputedStyle(document.documentElement).getPropertyValue('--paper').trim());
  copy.prepend(ground);
  return copy;
}

/** All of these are inherited, so only what differs from the parent has to be written. */
function writeStyles(target: SVGElement, original: SVGElement, parent: Element | null): void {
  const style = getComputedStyle(original);
  const inherited = parent ? getComputedStyle(parent) : null;
  for (const name of COPIED_STYLES) {
    const value = style.getPropertyValue(name);
    if (value !== inherited?.getPropertyValue(name)) target.style.setProperty(name, value);
  }
}

/** Nothing is painted between the two changes, so the reader does not see them. */
function withLightTheme<Result>(work: () => Result): Result {
  const root = document.documentElement;
  const before = root.getAttribute('data-theme');
  root.setAttribute('data-theme', 'light');
  try {
    return work();
  } finally {
    if (before === null) root.removeAttribute('data-theme');
    else root.setAttribute('data-theme', before);
  }
}

export async function svgToPng(source: string): Promise<Blob> {
  const image = new Image();
  image.src = `data:image/svg+xml;charset=utf-8,${encodeURIComponent(source)}`;
  await image.decode();
  const canvas = document.createElement('canvas');
  canvas.width = image.width * PNG_SCALE;
  canvas.height = image.height * PNG_SCALE;
  const context = canvas.getContext('2d');
  if (!context) throw new Error('the browser gave no drawing surface for the PNG');
  context.scale(PNG_SCALE, PNG_SCALE);
  context.drawImage(image, 0, 0);
  return new Promise((resolve, reject) =>
    canvas.toBlob(
      (blob) => (blob ? resolve(blob) : reject(new Error('the browser made no PNG'))),
      'image/png',
    ),
  );
}

export function saveFile(content: Blob, name: string): void {
  const link = document.createElement('a');
  link.href = URL.createObjectURL(content);
  link.download = name;
  link.click();
  URL.revokeObjectURL(link.href);
}
