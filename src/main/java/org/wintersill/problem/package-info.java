/**
 * <b>Purpose.</b> What can be said to a user: what is wrong, where, and what to do next.
 *
 * <p><b>May depend on.</b> The JDK only.
 *
 * <p><b>Conventions.</b> A {@link org.wintersill.problem.Problem} has three parts and a kind; the kind
 * decides the exit code. Problems are collected in {@link org.wintersill.problem.Problems} and thrown once,
 * so that nobody has to fix one mistake a run. Anything worth saying that does not stop the run goes to
 * {@link org.wintersill.problem.Notices}.
 */
package org.wintersill.problem;
