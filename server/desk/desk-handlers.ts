import { type DeskService } from '@/server/desk/desk-service';
import { type HandlersOf } from '@/server/http/handler';
import { type deskEndpoints } from '@/shared/desk/desk-endpoints';

export function deskHandlers(desks: DeskService): HandlersOf<typeof deskEndpoints> {
  return {
    readDesk: ({ scope }) => desks.read(scope),
    editDeskSettings: ({ scope, version, body }) => desks.edit(scope, version, body),
  };
}
