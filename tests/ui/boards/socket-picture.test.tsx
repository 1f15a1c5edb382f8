import { configure, screen } from '@testing-library/react';
import { SocketPicture } from '@/components/features/boards/socket-picture';
import { benchOf } from '@/components/features/diagnose/bench';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument } from '@/shared';
import { renderPage } from '../support/render';

configure({ defaultHidden: true });

function show(slug: string, label: string) {
  const { index } = benchOf(layoutDocument.parse(demoBoards.find((each) => each.slug === slug)?.document))!;
  return renderPage(<SocketPicture index={index} at={index.socketByLabel.get(label)!} />);
}

describe('the picture of a socket', () => {
  it('is drawn and told in the colours that are left', () => {
    show('penhallow-formset-2-pd-3', 'N22');
    const words =
      'Every eighth column from column 2: magenta in place of white where they read 0, green in place of black where they read 1.';
    expect(screen.getByText(words)).toBeInTheDocument();
    expect(screen.getByRole('img', { name: `The screen when it fails. ${words}` })).toBeInTheDocument();
  });

  it('says so where the screen shows nothing of the chip', () => {
    show('rimstad-ct-7-rev-3', 'E31');
    expect(screen.getByText('The screen shows nothing of this chip.')).toBeInTheDocument();
    expect(screen.queryByRole('img')).not.toBeInTheDocument();
  });

  it('is left out on a board whose memory is not a picture', () => {
    show('sandvoe-tg-3-issue-2', 'IC32');
    expect(screen.queryByText('The picture when it fails')).not.toBeInTheDocument();
  });
});
