import type { ReactElement } from 'react';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import type { AgreementFigure } from '@/lib/stats/agreement-figure';
import type { ComparedView } from './review-shapes';
import { figureWords, intervalWords, leftOutWords } from './review-words';

interface FigureRowProps {
  name: string;
  about: string;
  figure: Pick<AgreementFigure, 'value' | 'interval' | 'n'>;
}

function FigureRow({ name, about, figure }: FigureRowProps): ReactElement {
  return (
    <tr>
      <BodyCell>
        {name}
        <span className="block text-sm text-quiet">{about}</span>
      </BodyCell>
      <BodyCell number>{figureWords(figure.value)}</BodyCell>
      <BodyCell number className="whitespace-nowrap">
        {intervalWords(figure.interval)}
      </BodyCell>
      <BodyCell number>{figure.n}</BodyCell>
    </tr>
  );
}

/** How far the two readings agree, by every measure, each with its 95 % interval and the cells it is made from. */
export function FiguresTable({ compared }: { compared: ComparedView }): ReactElement {
  const { figures, agreement } = compared;
  const { raw } = figures;
  return (
    <>
      <p className="mb-2">
        {agreement.alike} of {agreement.compared} cells are read alike; {leftOutWords(agreement.leftOut)}.
      </p>
      <Table caption="Agreement of the two readings" scrolls>
        <thead>
          <tr>
            <HeadCell>Measure</HeadCell>
            <HeadCell className="text-right">Value</HeadCell>
            <HeadCell className="text-right">95 % interval</HeadCell>
            <HeadCell className="text-right">Cells</HeadCell>
          </tr>
        </thead>
        <tbody>
          <FigureRow
            name="Raw agreement"
            about="share of cells read alike"
            figure={{ value: raw.share, interval: raw.interval, n: raw.n }}
          />
          <FigureRow name="Cohen’s kappa" about="beyond chance, all states" figure={figures.kappa} />
          <FigureRow name="Kappa, linear weights" about="ordered stages, egg to capped" figure={figures.kappaLinear} />
          <FigureRow name="Kappa, quadratic weights" about="ordered stages" figure={figures.kappaQuadratic} />
          <FigureRow name="Krippendorff’s alpha, nominal" about="all states" figure={figures.alphaNominal} />
          <FigureRow name="Krippendorff’s alpha, ordinal" about="ordered stages" figure={figures.alphaOrdinal} />
        </tbody>
      </Table>
    </>
  );
}
