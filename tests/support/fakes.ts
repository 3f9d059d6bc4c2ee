// The mail stand-in on free ports.
import { startMailFake, type MailFake } from '../../fakes/mail/start';

export const createMailFake = (): Promise<MailFake> => startMailFake({ smtpPort: 0, webPort: 0 });
