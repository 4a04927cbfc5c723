package steelyard.adapters.cpsat;

import java.util.List;
import steelyard.adapters.spi.Setting;

/**
 * The options of the backend, by the library's own names where they are its own, with the library's
 * defaults. Names no type of the library.
 */
final class CpSatSettings {
  static final String BRANCHING = "branching";

  private CpSatSettings() {}

  static List<Setting> all() {
    return List.of(
        Setting.choice(
            BRANCHING,
            List.of("auto", "partial", "fixed", "ignore", "portfolio", "pseudo-cost", "lp"),
            "the model's branching: auto follows one if there is one and lets the solver complete"
                + " it; partial the same always; fixed follows nothing else; the others ignore it"),
        Setting.flag("cp_model_presolve", true, "simplify the model before the search"),
        Setting.integer("max_presolve_iterations", 3, 0, 100, "rounds of presolve at most"),
        Setting.integer("cp_model_probing_level", 2, 0, 3, "effort of probing in presolve"),
        Setting.integer(
            "presolve_inclusion_work_limit",
            100_000_000,
            0,
            1_000_000_000_000L,
            "effort of finding constraints within others; 0 is off"),
        Setting.integer("symmetry_level", 2, 0, 4, "effort of finding and using symmetries"),
        Setting.integer("linearization_level", 1, 0, 2, "how much goes into the linear program"),
        Setting.integer("cut_level", 1, 0, 1, "cuts in the linear program; 0 is off"),
        Setting.flag("optimize_with_core", false, "raise the bound by unsatisfiable cores"),
        Setting.flag("optimize_with_lb_tree_search", false, "raise the bound by a tree search"),
        Setting.flag("use_objective_lb_search", false, "try the objective at its bound first"),
        Setting.flag("permute_variable_randomly", false, "let the seed reorder variables inside"),
        Setting.flag(
            "permute_presolve_constraint_order", false, "let the seed reorder constraints inside"),
        Setting.real("random_branches_ratio", 0, 0, 1, "share of decisions taken at random"),
        Setting.real("random_polarity_ratio", 0, 0, 1, "share of values taken at random"),
        Setting.flag(
            "interleave_search", false, "threads take turns, which makes them reproducible"),
        Setting.flag("repair_hint", false, "try to mend a hint that is no solution"),
        Setting.flag(
            "use_precedences_in_disjunctive_constraint", true, "no-overlap uses known orders"),
        Setting.flag(
            "use_strong_propagation_in_disjunctive", false, "stronger filtering in no-overlap"),
        Setting.flag(
            "use_dynamic_precedence_in_disjunctive", false, "orders found in search, no-overlap"),
        Setting.flag(
            "use_disjunctive_constraint_in_cumulative",
            true,
            "tasks that cannot share, cumulative"),
        Setting.flag("use_overload_checker_in_cumulative", false, "energy check in cumulative"),
        Setting.flag(
            "use_timetable_edge_finding_in_cumulative", false, "edge finding in cumulative"),
        Setting.flag(
            "use_dynamic_precedence_in_cumulative", false, "orders found in search, cumulative"));
  }
}
