interface Report {
  readonly testResults: readonly {
    readonly name: string;
    readonly status: string;
    readonly assertionResults: readonly { readonly status: string; readonly fullName: string }[];
  }[];
}

export function count(report: Report, complain: (line: string) => void): { readonly passed: number; readonly failed: number };
