/** Which of the browser's permissions the page has: one, for a stated reason. Whatever is not listed is denied. */

import type { Session } from 'electron';
import { isOwnPage } from './ownPage';

const GRANTED: Readonly<Record<string, string>> = {
  'clipboard-sanitized-write': 'readings, tables and pictures are copied from the window',
};

export function isGranted(permission: string, requestedBy: string): boolean {
  return Object.hasOwn(GRANTED, permission) && isOwnPage(requestedBy);
}

/** Both handlers are needed: some permissions are only checked and never requested. */
export function guardPermissions(session: Session): void {
  session.setPermissionRequestHandler((_contents, permission, reply, details) =>
    reply(isGranted(permission, details.requestingUrl)),
  );
  session.setPermissionCheckHandler((_contents, permission, origin) => isGranted(permission, origin));
  session.setDevicePermissionHandler(() => false);
}
