;;; test.el --- Drives eglot against a real server  -*- lexical-binding: t -*-
;; Run by test.sh. Waits for what is to happen, never for a time.

(require 'cl-lib)
(load (getenv "SETTLEWELL_CLIENT"))

(defun fail (&rest format)
  (message "FAILED: %s" (apply #'format format))
  (kill-emacs 1))

(defun await (what condition)
  (let ((end (+ (float-time) 60)))
    (while (not (funcall condition))
      (when (> (float-time) end)
        (fail "%s never came" what))
      (accept-process-output nil 0.05))))

(setq eglot-sync-connect 60
      eglot-connect-timeout 60
      eglot-autoshutdown t)
(find-file (getenv "SETTLEWELL_TEST_SHEET"))
(unless (eglot-current-server)
  (apply #'eglot (eglot--guess-contact)))
(await "the server" #'eglot-current-server)
(flymake-mode 1)
(flymake-start)

(defun texts ()
  (mapcar #'flymake-diagnostic-text (flymake-diagnostics)))

(await "the finding" #'texts)
(unless (cl-some (lambda (text) (string-match-p "offered" text)) (texts))
  (fail "other findings: %S" (texts)))

(defun ask (method where &optional extra)
  (goto-char (point-min))
  (search-forward where)
  (goto-char (1+ (match-beginning 0)))
  (jsonrpc-request (eglot-current-server) method
                   (append (eglot--TextDocumentPositionParams) extra)
                   :timeout 60))

(let ((hover (format "%S" (ask :textDocument/hover "needs:"))))
  (unless (string-match-p "error at 95" hover)
    (fail "hover says %s" hover)))

(let ((items (format "%S" (ask :textDocument/completion "voltage:"))))
  (unless (string-match-p "thermistor" items)
    (fail "completion says %s" items)))

(goto-char (point-min))
(search-forward "13 cycles")
(let* ((here (eglot--pos-to-lsp-position (1+ (match-beginning 0))))
       (actions (jsonrpc-request
                 (eglot-current-server) :textDocument/codeAction
                 (list :textDocument (eglot--TextDocumentIdentifier)
                       :range (list :start here :end here)
                       :context (list :diagnostics []))
                 :timeout 60))
       (fix (cl-find-if (lambda (action)
                          (and (equal (plist-get action :kind) "quickfix")
                               (not (string-match-p "Accept" (plist-get action :title)))))
                        actions)))
  (unless fix
    (fail "no fix among %S" actions))
  (eglot--apply-workspace-edit (plist-get fix :edit)))
;; In batch mode nothing is ever idle, which is when eglot tells of changes.
(eglot--signal-textDocument/didChange)
(await "the end of the finding" (lambda () (null (texts))))
(set-buffer-modified-p nil)
(message "passed: findings, hover, completion, fix")
(kill-emacs 0)
;;; test.el ends here
