/**
 * <b>Purpose.</b> The fold over days and winters: how the work is cut up, done by several threads within a memory limit, and
 * kept until it is summarised.
 *
 * <p><b>May depend on.</b> All rooms of the science and the ports; no file format.
 *
 * <p><b>Conventions.</b> A band is a run of full target rows worked on from the first day to the last; a batch is a run of days
 * decoded at once; a piece is the part of a batch that belongs to one winter; a lane is a few target rows folded by one
 * worker; a stretch is a handful of nights of a lane. None of these changes a result: the same bytes come out for any bands,
 * batches, lanes and threads. Start reading in {@link org.wintersill.engine.LocalEngine}.
 */
package org.wintersill.engine;
