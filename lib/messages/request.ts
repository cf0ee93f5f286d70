import { getRequestConfig } from 'next-intl/server';
import en from './en.json';

/** Pages are English; a bench sets its operator's own language in its client provider. */
export default getRequestConfig(async () => ({ locale: 'en', messages: en, timeZone: 'UTC' }));
