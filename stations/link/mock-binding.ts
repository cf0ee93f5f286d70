// @ts-expect-error The package hides its types behind `exports`; the lines below name them.
import * as mock from '@serialport/binding-mock';
import type { MockBindingInterface, MockPortBinding } from '../../node_modules/@serialport/binding-mock/dist/index.js';
import type { BindingInterface } from '../../node_modules/@serialport/bindings-interface/dist/index.js';

export const MockBinding: MockBindingInterface & BindingInterface<MockPortBinding> = mock.MockBinding;
export type { MockPortBinding };
