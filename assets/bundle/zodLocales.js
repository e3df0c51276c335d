// Stands in for zod's list of about fifty languages in the web bundle (metro.config.js): the product speaks one.
export { default as en } from 'zod/v4/locales/en.js';
