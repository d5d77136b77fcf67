import { prepareStage, type PreparedStage } from '../../../src/drawing/prepare.ts';
import { routeWires } from '../../../src/stage/routing/index.ts';
import { divider } from '../desk/stages.ts';

/** The divider as it is drawn: R1 upright about (120, 72), R2 about (120, 192), TP1 to the right of the joint between. */
export const preparedDivider = async (): Promise<PreparedStage> => {
  const document = await divider();
  return prepareStage(document, routeWires(document));
};
