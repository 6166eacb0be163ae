package org.wintersill.cli;

/** What {@code plan} is asked beyond the configuration: whether the plan is told as one JSON document. */
public record PlanOptions(boolean json) {
}
