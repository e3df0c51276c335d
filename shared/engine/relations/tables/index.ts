import generalised1980 from './generalised1980.json';
import karplus1963 from './karplus1963.json';
import karplus1963Cycloalkane from './karplus1963Cycloalkane.json';
import karplus1963Ethane from './karplus1963Ethane.json';
import karplus1959 from './karplus1959.json';
import threeTermNoPaper from './threeTermNoPaper.json';
import alkenes from './alkenes.json';

/**
 * Every relation row held, as JSON, in the order in which lists show them. A changed digit is a new version: add a
 * file and keep the old one as superseded. `server/relations` reads them with a schema at start; a device gets them
 * from `GET /api/relations` and passes them to `registryFromJson`.
 */
export const tableRows: readonly unknown[] = [
  generalised1980,
  karplus1963,
  karplus1963Cycloalkane,
  karplus1963Ethane,
  karplus1959,
  threeTermNoPaper,
  alkenes,
];
