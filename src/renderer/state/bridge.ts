/** The way to files and menus: the desktop program's bridge, or what a plain browser can do instead. */

import type { Bridge } from '../../main/bridge';
import { browserBridge } from './browserBridge';

export const bridge: Bridge = window.ohmstrata ?? browserBridge();
