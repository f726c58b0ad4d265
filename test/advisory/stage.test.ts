import { describe, expect, test } from 'vitest';
import { carriedStage, saysDissipated, stageOfRemark, stageOfTitle } from '../../lib/advisory/stage';

describe('the stage a title gives', () => {
  test.each([
    ['TROPICAL DEPRESSION', 'depression'],
    ['TROPICAL STORM', 'tropical'],
    ['HURRICANE', 'tropical'],
    ['TYPHOON', 'tropical'],
    ['SUBTROPICAL STORM', 'subtropical'],
    ['SUBTROPICAL DEPRESSION', 'subtropical'],
    ['POST-TROPICAL CYCLONE', 'post-tropical'],
    ['EXTRATROPICAL STORM', 'post-tropical'],
    ['REMNANTS OF', 'remnant-low'],
    ['POTENTIAL TROPICAL CYCLONE', 'disturbance'],
    ['POTENTIAL TROP CYCLONE', 'disturbance'],
  ])('%s: %s', (title, stage) => expect(stageOfTitle(title)).toBe(stage));

  test.each(['TROPICAL CYCLONE', ''])('"%s" gives none', (title) => expect(stageOfTitle(title)).toBeUndefined());
});

describe('the stage a remark gives', () => {
  test.each([
    ['EXTRATROPICAL', 45, 'post-tropical'],
    ['POST-TROP/EXTRATROP', 55, 'post-tropical'],
    ['POST-TROPICAL', 55, 'post-tropical'],
    ['POST-TROP/REMNT LOW', 30, 'remnant-low'],
    ['REMNANT LOW', 30, 'remnant-low'],
    ['SUBTROPICAL', 40, 'subtropical'],
    ['TROPICAL CYCLONE', 35, 'tropical'],
    ['TROPICAL CYCLONE', 30, 'depression'],
    ['FRONTAL SYSTEM', 40, 'post-tropical'],
  ])('%s at %i kt: %s', (remark, kt, stage) => expect(stageOfRemark(remark, kt)).toBe(stage));

  test.each(['INLAND', 'INLAND DISSIPATING', 'DISSIPATING', 'BECOMING EXTRATROPICAL', 'BECOMING POST-TROP/EXTRATROP', 'BECOMING REMNANT LOW', ''])('"%s" gives none', (remark) => expect(stageOfRemark(remark, 40)).toBeUndefined());
});

describe('the stage carried from point to point', () => {
  test('a storm that weakens below 34 kt is a depression', () => expect(carriedStage('tropical', '', 30)).toBe('depression'));
  test('a depression that reaches 34 kt is a storm', () => expect(carriedStage('depression', '', 34)).toBe('tropical'));
  test('a subtropical storm stays one until said otherwise', () => expect(carriedStage('subtropical', '', 30)).toBe('subtropical'));
  test('what is post-tropical stays so', () => expect(carriedStage('post-tropical', '', 60)).toBe('post-tropical'));
  test('a remark goes before what was', () => expect(carriedStage('tropical', 'POST-TROP/REMNT LOW', 30)).toBe('remnant-low'));
  test('unknown stays unknown', () => expect(carriedStage(undefined, 'INLAND', 50)).toBeUndefined());
});

test('only what has gone leaves no position', () => {
  expect(saysDissipated('DISSIPATED')).toBe(true);
  expect(saysDissipated('ABSORBED BY FRONTAL SYSTEM')).toBe(true);
  expect(saysDissipated('DISSIPATING')).toBe(false);
});
