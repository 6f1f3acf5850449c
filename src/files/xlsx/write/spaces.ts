/** Name spaces of ECMA-376, transitional, which every worksheet program reads. */
export const mainSpace = "http://schemas.openxmlformats.org/spreadsheetml/2006/main";
export const officeRelationships = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";
export const packageRelationships = "http://schemas.openxmlformats.org/package/2006/relationships";
export const contentTypesSpace = "http://schemas.openxmlformats.org/package/2006/content-types";
export const xmlDeclaration = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\n';
