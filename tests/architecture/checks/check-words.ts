import type { HouseFile } from '@/tests/architecture/checks/repository-files';

/** Text that may not stand in the house, with the reason. Written in parts, so that this list does not find itself. */
const forbiddenText: readonly (readonly [RegExp, string])[] = [
  [new RegExp(`\\b(TO${'DO'}|FIX${'ME'}|XX${'X'}|HA${'CK'})\\b`), 'work left over: do it or file an issue'],
  [new RegExp(`\\bas a${'ny'}\\b|<a${'ny'}>`), 'a cast that believes everything'],
  [new RegExp(`@ts-(igno${'re'}|noche${'ck'}|expect-err${'or'})`), 'a silenced compiler'],
  [new RegExp(`eslint-disa${'ble'}`), 'a silenced lint'],
  [new RegExp(`(^|[\\s"'\`(=:])/(ho${'me'}|wo${'rk'}|ro${'ot'}|Us${'ers'})/(?!somebody)[a-z]`, 'm'), 'a path of one machine'],
  [new RegExp(`regis${'try'}\\.npmjs|npm${'mirror'}|artifac${'tory'}|verdac${'cio'}|nex${'us'}/repository`, 'i'), 'a package host of one machine'],
  [new RegExp(`/tm${'p'}/`), 'a folder of one machine: ask the system for its temporary folder'],
  [new RegExp(`\\b(conduct${'ion'}|pract${'ice'}|tru${'st'}|sta${'ck'}|anch${'ors'}|archit${'ecture'}|prod${'uct'})\\.m${'d'}\\b`), 'a page that is not in the house'],
  [new RegExp(`\\b(it|test|describe)\\.(sk${'ip'}|on${'ly'}|fai${'ls'})\\b`), 'a test that does not run, or hides the others'],
];

/** Problems of single lines: leftovers, silenced checks, and what belongs to one machine only. */
export function checkWords(file: HouseFile): readonly string[] {
  return file.text.split('\n').flatMap((line, index) =>
    forbiddenText.filter(([pattern]) => pattern.test(line)).map(([, reason]) => `${file.path}:${index + 1}: ${reason}: ${line.trim().slice(0, 80)}`),
  );
}
