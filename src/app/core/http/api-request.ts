import { HttpHeaders, HttpParams } from '@angular/common/http';

/** A query for the API's address: what is undefined or empty is left out. */
export function queryParams(query: object): HttpParams {
  const given = Object.entries(query).filter(
    ([, value]) => value !== undefined && value !== null && value !== '',
  );
  return new HttpParams({
    fromObject: Object.fromEntries(given.map(([name, value]) => [name, String(value)])),
  });
}

/** Says which version of the record is being changed. */
export function ifMatch(version: number): { headers: HttpHeaders } {
  return { headers: new HttpHeaders({ 'If-Match': `"${version}"` }) };
}
