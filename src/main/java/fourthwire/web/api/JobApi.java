package fourthwire.web.api;

import fourthwire.jobs.ReadingService;
import fourthwire.metering.ReadingUploads;
import io.swagger.v3.oas.annotations.Operation;
import io.swagger.v3.oas.annotations.media.Schema;
import io.swagger.v3.oas.annotations.responses.ApiResponse;
import io.swagger.v3.oas.annotations.tags.Tag;
import java.util.OptionalLong;
import org.springframework.http.MediaType;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RestController;

/** Jobs that read meters' files. */
@RestController
@RequestMapping(path = "/api/v1/jobs/{job}", produces = MediaType.APPLICATION_JSON_VALUE)
@Tag(name = "Jobs", description = "Work that a call began and that goes on in the background")
class JobApi {
  private final ReadingService service;
  private final ReadingUploads uploads;

  JobApi(ReadingService service, ReadingUploads uploads) {
    this.service = service;
    this.uploads = uploads;
  }

  /** A job. */
  @Schema(name = "Job", description = "Work in the background and how far it is")
  record State(
      @Schema(description = "Id of the job") long id,
      @Schema(allowableValues = {"queued", "running", "done", "failed", "cancelled"}) String state,
      @Schema(description = "0 to 1") double progress,
      @Schema(description = "What is being done, or why it failed") String message,
      @Schema(
              description = "Id of the reading it made; null until it is done",
              types = {"integer", "null"})
          OptionalLong result) {}

  @GetMapping
  @Operation(summary = "How far a job is")
  @ApiResponse(responseCode = "200", description = "Its state")
  State get(@PathVariable long job) {
    return uploads.find(job).map(JobApi::state).orElseThrow(() -> MissingException.job(job));
  }

  @PostMapping("/cancel")
  @Operation(summary = "Ask a job to stop", description = "One that has ended stays as it is.")
  @ApiResponse(responseCode = "200", description = "Its state after asking")
  State cancel(@PathVariable long job) {
    service.cancel(job);
    return get(job);
  }

  private static State state(ReadingUploads.Entry e) {
    boolean waits = e.state() == ReadingUploads.State.WAITING;
    return new State(
        e.id(),
        waits ? ReadingUploads.State.QUEUED.word() : e.state().word(),
        e.progress(),
        waits ? "waits until its columns are confirmed on its page" : e.message(),
        e.reading());
  }
}
