const ESCAPES: Record<string, string> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&apos;',
};

type XmlValue = string | number | boolean | XmlFields | XmlFields[] | undefined;
export interface XmlFields {
  [name: string]: XmlValue;
}

function element(name: string, value: XmlValue): string {
  if (value === undefined) return '';
  if (Array.isArray(value)) return value.map((item) => element(name, item)).join('');
  if (typeof value === 'object') return `<${name}>${fields(value)}</${name}>`;
  return `<${name}>${String(value).replace(/[&<>"']/g, (character) => ESCAPES[character]!)}</${name}>`;
}

function fields(values: XmlFields): string {
  return Object.entries(values)
    .map(([name, value]) => element(name, value))
    .join('');
}

/** One S3 answer document; arrays become repeated elements, undefined leaves the element out. */
export function xmlDocument(rootName: string, values: XmlFields): string {
  const namespace = rootName === 'Error' ? '' : ' xmlns="http://s3.amazonaws.com/doc/2006-03-01/"';
  return `<?xml version="1.0" encoding="UTF-8"?>\n<${rootName}${namespace}>${fields(values)}</${rootName}>`;
}

/** The parts named in a CompleteMultipartUpload body, in the order given. */
export function readCompletedParts(body: string): { partNumber: number; etag: string }[] {
  return [...body.matchAll(/<Part>([\s\S]*?)<\/Part>/g)].map(([, part = '']) => ({
    partNumber: Number(/<PartNumber>\s*(\d+)\s*<\/PartNumber>/.exec(part)?.[1]),
    etag: (/<ETag>([\s\S]*?)<\/ETag>/.exec(part)?.[1] ?? '').replace(/&quot;|&#34;|"/g, '').trim(),
  }));
}
