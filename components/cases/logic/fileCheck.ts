import { LIMITS } from '@/shared/limits';
import { uiCaseParts } from '@/shared/text/uiCaseParts';

const say = uiCaseParts.evidence;
const MIB = 1024 * 1024;

/** "3.4 MB", "12 kB": a file's size as a person reads it. */
export function bytesWords(bytes: number): string {
  if (bytes < 1024) return `${bytes}\u00A0B`;
  return bytes < MIB ? `${Math.round(bytes / 1024)}\u00A0kB` : `${(bytes / MIB).toFixed(1)}\u00A0MB`;
}

/** Why a file cannot be attached, before it is sent; undefined when it may be. The server looks into it as well. */
export function fileProblem(file: { name: string; size: number }, held: number): string | undefined {
  if (held >= LIMITS.attachmentsPerCase) return say.tooMany;
  if (file.size === 0) return say.emptyFile(file.name);
  if (file.size > LIMITS.attachmentBytes) return say.tooLarge(file.name, bytesWords(file.size));
  return file.name.length > LIMITS.fileName ? say.longName(file.name) : undefined;
}
