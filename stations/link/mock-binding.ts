// @ts-expect-error The package hides its types behind `exports`; the line below names them.
import * as mock from '@serialport/binding-mock';
import type { MockBindingInterface, MockPortBinding } from '../../node_modules/@serialport/binding-mock/dist/index.js';

export const MockBinding: MockBindingInterface = mock.MockBinding;
export type { MockPortBinding };
