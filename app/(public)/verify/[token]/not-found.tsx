import { UnknownCertificate } from '@/components/verify/unknown-certificate';

export default function NoSuchCertificate() {
  return <UnknownCertificate />;
}
