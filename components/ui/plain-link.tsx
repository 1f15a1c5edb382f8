import { useTheme } from '@/components/theme';
import { createDomElement } from './dom-element';

type PlainLinkProps = { href: string; children: string };

/** A link to what is no page of the application: a document of the API. The browser goes there itself. */
export function PlainLink({ href, children }: PlainLinkProps) {
  const { colours, text, target } = useTheme();
  return createDomElement('a', {
    href,
    style: {
      ...text.strong,
      display: 'inline-flex',
      alignItems: 'center',
      minHeight: target,
      color: colours.pen,
      textDecorationLine: 'underline',
    },
    children,
  });
}
