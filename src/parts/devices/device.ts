export type DeviceType = 'mosfet' | 'bipolar' | 'diode' | 'led' | 'zener';

// Filled in beside the device schemas.
export interface Device {
  readonly type: DeviceType;
}
