import { fileTypeFromBuffer } from 'file-type/core';

import { casesText } from '@/shared/text/cases';

const kinds = casesText.attachment.kinds;

/** What a file is by its bytes; its name is never believed. */
export type Sniffed = { kept: true; mediaType: string } | { kept: false; sentence: string };

const refuse = (what: string): Sniffed => ({ kept: false, sentence: casesText.attachment.disguised(what) });
const keep = (mediaType: string): Sniffed => ({ kept: true, mediaType });

/** Pictures, papers and archives that a spectrum or a report comes as. */
const KEPT = new Set([
  'image/png', 'image/jpeg', 'image/gif', 'image/webp', 'image/tiff', 'image/bmp', 'image/heic', 'image/avif', 'application/pdf',
  'application/zip', 'application/gzip', 'application/x-7z-compressed', 'application/x-tar', 'application/x-bzip2', 'application/x-xz', 'application/zstd',
  'application/vnd.openxmlformats-officedocument.wordprocessingml.document', 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
  'application/vnd.openxmlformats-officedocument.presentationml.presentation', 'application/vnd.oasis.opendocument.text',
  'application/vnd.oasis.opendocument.spreadsheet', 'application/vnd.oasis.opendocument.presentation', 'application/rtf', 'application/x-cfb', 'application/x-hdf5',
]);

/** Programs by their first bytes: ELF, Windows, Mach-O (both orders and fat), WebAssembly, Java class. */
const PROGRAMS = ['7f454c46', '4d5a', 'feedface', 'feedfacf', 'cefaedfe', 'cffaedfe', 'cafebabe', '0061736d'];

/** Characters that a text file does not hold: control characters other than tab, line ends, form feed and escape-free extras. */
const CONTROL = /[\u0000-\u0008\u000b\u000e-\u001f]/;

function asText(bytes: Buffer): string | null {
  try {
    const text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
    return CONTROL.test(text) ? null : text;
  } catch {
    // spectrometers still write Latin-1: every byte is a character there, so only control characters speak against it
    const text = bytes.toString('latin1');
    return CONTROL.test(text) || /[\u007f-\u009f]/.test(text) ? null : text;
  }
}

/** Text that a browser would run or draw as a page, wherever in the file it begins. */
function activeText(text: string): string | null {
  const start = text.replace(/^\ufeff/, '').trimStart().slice(0, 4096).toLowerCase();
  if (start.startsWith('#!')) return kinds.script;
  if (/<svg[\s>:]/.test(start) || /<\w+:svg[\s>]/.test(start)) return kinds.svg;
  if (/<!doctype\s+html|<html[\s>]|<head[\s>]|<body[\s>]|<script[\s>/]|<iframe[\s>]|<object[\s>]|<embed[\s>]/.test(start)) return kinds.html;
  if (start.startsWith('<?xml') || /^<[a-z!?]/.test(start)) return kinds.html;
  if (/<script[\s>/]/i.test(text)) return kinds.html;
  return null;
}

function textType(text: string): string {
  const start = text.replace(/^\ufeff/, '').slice(0, 65_536);
  const lines = start.split(/\r\n?|\n/);
  if (/^\s*##TITLE=/im.test(start) && /^\s*##JCAMP/im.test(start)) return 'chemical/x-jcamp-dx';
  if (/^\s*\d{1,3}\s*\d{1,3}.*V[23]000\s*$/.test(lines[3] ?? '')) return start.includes('$$$$') ? 'chemical/x-mdl-sdfile' : 'chemical/x-mdl-molfile';
  const rows = lines.filter((line) => line.trim() !== '' && !line.startsWith('#')).slice(0, 20);
  for (const mark of [',', ';', '\t']) {
    const counts = new Set(rows.map((row) => row.split(mark).length));
    if (rows.length >= 2 && counts.size === 1 && !counts.has(1)) return mark === '\t' ? 'text/tab-separated-values' : 'text/csv';
  }
  return 'text/plain';
}

/** Decides by the bytes whether a file is kept and as what; a file that hides a program or a page is refused in a sentence. */
export async function sniff(bytes: Buffer): Promise<Sniffed> {
  const head = bytes.subarray(0, 4).toString('hex');
  if (PROGRAMS.some((start) => head.startsWith(start))) return refuse(kinds.program);
  const found = await fileTypeFromBuffer(bytes);
  if (found) {
    if (found.mime === 'application/xml' || found.mime.endsWith('+xml')) return refuse(/svg/.test(found.mime) ? kinds.svg : kinds.html);
    if (KEPT.has(found.mime)) return keep(found.mime);
  }
  const text = asText(bytes);
  if (text === null) return { kept: false, sentence: casesText.attachment.unknown };
  const active = activeText(text);
  return active === null ? keep(textType(text)) : refuse(active);
}
