import { HttpClient, type HttpEvent } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { type LaserImport, laserImportSchema } from '@shared/model/laser-imports';
import { map, type Observable } from 'rxjs';

@Injectable({ providedIn: 'root' })
export class LaserImportsApi {
  private readonly http = inject(HttpClient);

  /** Sends the file; the dry run then goes on by itself. */
  begin(file: File): Observable<HttpEvent<unknown>> {
    const body = new FormData();
    body.set('file', file);
    return this.http.post('/api/laser-imports', body, { observe: 'events', reportProgress: true });
  }

  read(id: string): Observable<LaserImport> {
    return this.http
      .get(`/api/laser-imports/${id}`)
      .pipe(map((body) => laserImportSchema.parse(body)));
  }

  save(id: string): Observable<LaserImport> {
    return this.http
      .post(`/api/laser-imports/${id}/save`, {})
      .pipe(map((body) => laserImportSchema.parse(body)));
  }

  cancel(id: string): Observable<void> {
    return this.http.delete<void>(`/api/laser-imports/${id}`);
  }
}
