/**
 * Codes that the run itself gives to an ending without a verdict, printed beside the sentence so that the engineer on
 * the phone can be told. F: fixture. S: supply. R: the run. Instruments bring their own.
 */
export const faultCodes = {
  contactTooHigh: 'F-101',
  contactOpen: 'F-102',
  boardRemoved: 'F-103',
  lidOpened: 'F-104',
  pulseWidth: 'F-105',
  noController: 'F-106',
  noWiperProbe: 'F-107',
  supplyTooLow: 'S-291',
  notConfirmedOff: 'S-290',
  incomplete: 'R-901',
} as const;
