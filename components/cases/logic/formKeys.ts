/** Keys of half-typed forms on the device; all of a case begin alike, so that its list row can say "on this device". */
export const formKey = (caseId: string, form: string): string => `case.${caseId}.form.${form}`;
