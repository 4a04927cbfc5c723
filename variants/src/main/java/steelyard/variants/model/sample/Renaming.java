package steelyard.variants.model.sample;

import java.util.List;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Rewriting;
import steelyard.variants.model.Term;
import steelyard.variants.model.View;

/** Puts the variables of a model in the places of a sketch's. */
final class Renaming {
  private final List<IntVar> variables;

  /** Reads {@code variables} as they are at each use. */
  Renaming(List<IntVar> variables) {
    this.variables = variables;
  }

  private Rewriting rewriting() {
    return new Rewriting() {
      @Override
      public int variable(int old) {
        return variables.get(old).id();
      }

      @Override
      public int[] rows(int size, java.util.function.IntBinaryOperator byContent) {
        return java.util.stream.IntStream.range(0, size).toArray();
      }
    };
  }

  Formula formula(Formula formula) {
    if (formula instanceof Formula.Compare it) {
      return new Formula.Compare(term(it.left()), it.op(), term(it.right()));
    } else if (formula instanceof Formula.Literal it) {
      return new Formula.Literal(atom(it.atom()));
    } else if (formula instanceof Formula.Holds it) {
      return new Formula.Holds(it.relation().rewrite(rewriting()));
    } else if (formula instanceof Formula.All it) {
      return new Formula.All(it.parts().stream().map(this::formula).toList());
    } else if (formula instanceof Formula.Any it) {
      return new Formula.Any(it.parts().stream().map(this::formula).toList());
    } else if (formula instanceof Formula.Not it) {
      return new Formula.Not(formula(it.part()));
    }
    Formula.Iff it = (Formula.Iff) formula;
    return new Formula.Iff(formula(it.left()), formula(it.right()));
  }

  private Atom atom(Atom atom) {
    return atom.isConstant()
        ? atom
        : new Atom(variables.get(atom.variable()).id(), atom.op(), atom.value());
  }

  Term term(Term term) {
    if (term instanceof IntVar it) {
      return variables.get(it.id());
    } else if (term instanceof View it) {
      return it.isConstant()
          ? it
          : new View(variables.get(it.variable()).id(), it.sign(), it.offset());
    } else if (term instanceof Term.Sum it) {
      return new Term.Sum(terms(it.terms()), it.coefficients());
    } else if (term instanceof Term.Largest it) {
      return new Term.Largest(terms(it.terms()));
    } else if (term instanceof Term.Smallest it) {
      return new Term.Smallest(terms(it.terms()));
    } else if (term instanceof Term.Absolute it) {
      return new Term.Absolute(term(it.term()));
    } else if (term instanceof Term.Entry it) {
      return new Term.Entry(terms(it.array()), term(it.index()));
    } else if (term instanceof Term.Truth it) {
      return new Term.Truth(formula(it.formula()));
    }
    return binary(term);
  }

  private Term binary(Term term) {
    if (term instanceof Term.Product it) {
      return new Term.Product(term(it.left()), term(it.right()));
    } else if (term instanceof Term.Quotient it) {
      return new Term.Quotient(term(it.dividend()), term(it.divisor()));
    } else if (term instanceof Term.Remainder it) {
      return new Term.Remainder(term(it.dividend()), term(it.divisor()));
    }
    return term;
  }

  private List<Term> terms(List<Term> terms) {
    return terms.stream().map(this::term).toList();
  }
}
