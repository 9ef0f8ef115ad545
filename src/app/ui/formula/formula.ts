import { NgTemplateOutlet } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type MathNode, parseInfix } from '@shared/drawing/infix';

/** Plain infix mathematics set as on paper: fractions, roots, indices, Greek. */
@Component({
  selector: 'lm-formula',
  imports: [NgTemplateOutlet],
  templateUrl: './formula.html',
  styleUrl: './formula.scss',
  host: { role: 'math', '[attr.aria-label]': 'text()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Formula {
  readonly text = input.required<string>();

  protected readonly node = computed(() => parseInfix(this.text()));

  /** A fraction bar, a root and an exponent group by themselves. */
  protected bare(node: MathNode): MathNode {
    return node.kind === 'group' ? node.of : node;
  }

  /** A single letter is a quantity and slants; words and digits stand. */
  protected isVariable(base: string): boolean {
    return [...base].length === 1;
  }

  protected sign(operator: string): string {
    return { '*': '·', '-': '−', '+': '+', '=': '=' }[operator] ?? operator;
  }

  /** "1.064e-6" as mantissa and power of ten. */
  protected scientific(text: string): { mantissa: string; exponent: string } | null {
    const [mantissa = '', exponent] = text.toLowerCase().split('e');
    return exponent === undefined
      ? null
      : { mantissa, exponent: String(Number(exponent)).replace('-', '−') };
  }

  protected callName(name: string): { word: string; index: string } {
    return name === 'log10' ? { word: 'log', index: '10' } : { word: name, index: '' };
  }
}
