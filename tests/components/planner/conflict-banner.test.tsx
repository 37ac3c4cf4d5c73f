import { fireEvent, screen } from '@testing-library/react';
import { ConflictBanner } from '@/components/planner/conflict-banner';
import { renderScreen } from '@/tests/components/support/render-screen';
import { sampleDraft, sampleLeg, sampleMe } from '@/tests/components/support/sample-journal';
import { type Entry } from '@/shared/entries/entry';

function show(theirs: Entry) {
  const chosen: unknown[] = [];
  renderScreen(
    <ConflictBanner
      theirs={theirs}
      onKeepMine={(version) => chosen.push(version)}
      onTakeTheirs={(entry) => chosen.push(entry)}
    />,
    { 'GET /account/me': sampleMe },
  );
  return chosen;
}

describe('a plan that was changed elsewhere', () => {
  it('can be kept as it is here, on top of the other version', () => {
    const chosen = show(sampleDraft([sampleLeg()], { version: 7 }));
    fireEvent.click(screen.getByRole('button', { name: 'Keep what is here' }));
    expect(chosen).toEqual([7]);
  });

  it('can be given up for the other version', () => {
    const theirs = sampleDraft([sampleLeg()], { version: 7 });
    const chosen = show(theirs);
    fireEvent.click(screen.getByRole('button', { name: 'Take the other version' }));
    expect(chosen).toEqual([theirs]);
  });

  it('cannot be kept once the other version is sealed', () => {
    show(sampleDraft([sampleLeg()], { state: 'sealed' }));
    expect(screen.getByText('This plan was sealed elsewhere.')).toBeTruthy();
    expect(screen.queryByRole('button', { name: 'Keep what is here' })).toBeNull();
    expect(screen.getByRole('button', { name: 'Take the other version' })).toBeTruthy();
  });
});
