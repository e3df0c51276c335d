import { asNumber, asText } from '../../lib/read';
import { type Adapter, notCovered, unknownKey } from './adapter';
import { askQuickLook } from './quickLook';

/** Which form a coupling is typed into; one that no form takes yet is not covered. */
function formFor(coupling: unknown, structure: unknown): Record<string, unknown> | undefined {
  if (structure !== undefined) return { bond: 'double', smiles: structure };
  if (coupling === undefined || coupling === '3J(H,H)') return { bond: 'single' };
  if (coupling === '3J across C=C, acyclic carbon substituents') {
    return { bond: 'double', groups: { left: ['C', 'H'], right: ['C', 'H'] } };
  }
  return undefined;
}

/** What the form does with a value as typed: refuse, ask, warn, note what was read, or accept. */
export const inputGate: Adapter = async (given, api) => {
  const stranger = unknownKey(given, ['J', 'coupling', 'sigma', 'spectrometer_MHz', 'structure', 'unit']);
  if (stranger !== undefined) return notCovered(`${stranger} has no place in the product yet`);
  const form = formFor(given.coupling, given.structure);
  if (form === undefined) return notCovered(`no form takes ${JSON.stringify(given.coupling)} yet`);
  const j = asNumber(given.J) ?? asText(given.J);
  const unit = asText(given.unit);
  return askQuickLook(api, { ...form, j: j !== undefined && unit !== undefined ? `${j} ${unit}` : given.J, se: given.sigma, fieldMHz: given.spectrometer_MHz });
};
