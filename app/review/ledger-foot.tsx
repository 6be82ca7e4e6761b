import type { ConditionResult } from "../../lib/mna/solution";
import { tinyWords } from "../wording/numbers";

/** The key of the dumbbells and the certificate of the condition at hand: no number without its proof. */
export function LedgerFoot(props: {
  readonly condition: ConditionResult | null;
  readonly engine: string;
  readonly policy: string;
}) {
  const { condition } = props;
  return (
    <>
      <div className="key">
        <span>
          <svg width="14" height="12" aria-hidden="true">
            <circle cx="7" cy="6" r="3.4" fill="none" stroke="currentColor" strokeWidth="1.5" />
          </svg>
          was
        </span>
        <span>
          <svg width="14" height="12" aria-hidden="true">
            <circle cx="7" cy="6" r="3.8" fill="currentColor" />
          </svg>
          is
        </span>
        <span>
          <svg width="14" height="12" aria-hidden="true">
            <path d="M7 .5l5.5 5.5l-5.5 5.5l-5.5 -5.5Z" fill="var(--red)" />
          </svg>
          is, past a limit
        </span>
        <span>
          <svg width="14" height="12" aria-hidden="true">
            <rect x="3" y="2" width="8" height="8" fill="currentColor" />
          </svg>
          waived
        </span>
        <span>
          <svg width="14" height="12" aria-hidden="true">
            <path d="M4 1l7 5l-7 5z" fill="currentColor" />
          </svg>
          beyond the axis
        </span>
        <span>
          <svg width="22" height="10" aria-hidden="true">
            <rect width="22" height="10" fill="var(--band)" />
          </svg>
          tolerance band
        </span>
        <span>
          <svg width="18" height="12" aria-hidden="true">
            <path
              d="M5 1H1V11H5M13 1H17V11H13"
              fill="none"
              stroke="currentColor"
              strokeWidth="1.5"
            />
          </svg>
          limit
        </span>
      </div>
      <p className="cert">
        {condition?.certificate == null
          ? "No certificate: this condition has no solution to certify."
          : `Certificate, ${condition.name}: Kirchhoff residual ${tinyWords(condition.certificate.kclResidual)}, power balance ${tinyWords(condition.certificate.powerBalance)}, error bound ${tinyWords(condition.certificate.errorBound)}, ${condition.certificate.iterations} iterations (${condition.certificate.method}), engine ${props.engine}. Policy: ${props.policy}.`}
      </p>
    </>
  );
}
