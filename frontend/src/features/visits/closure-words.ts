import { useTranslation } from 'react-i18next';

/** The days off of 5 U.S.C. 6103(a) by the codes the server names them with; anything else is the department's own words. */
const holidayCodes: readonly string[] = [
  'new-years-day',
  'martin-luther-king-day',
  'washingtons-birthday',
  'memorial-day',
  'juneteenth',
  'independence-day',
  'labor-day',
  'columbus-day',
  'veterans-day',
  'thanksgiving-day',
  'christmas-day',
];

/** Why a department is closed, in the reader's words where it is a public holiday, else as the department wrote it. */
export function useClosureWords(): (why: string) => string {
  const { t } = useTranslation('visits');
  return (why) => (holidayCodes.includes(why) ? t(`holidays.${why}`) : why);
}
